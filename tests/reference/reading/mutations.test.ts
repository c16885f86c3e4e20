import { describe, expect, it } from 'vitest'
import { readRecording } from '../../../shared/recordings/read-recording.ts'
import { runMutations, wholeFiles } from './run-mutations.ts'
import { slowNumber } from './slow-reader.ts'

describe('reading damaged files', () => {
  it('takes their numbers as a second, slow reader does, or says in a note what it did', () => {
    const { faults, accepted, noted, equal } = runMutations(1000)
    expect(faults).toStrictEqual([])
    expect(accepted).toBeGreaterThan(200)
    expect(equal).toBeGreaterThan(80)
    expect(noted).toBeGreaterThan(80)
  })

  it('starts from files that are whole', () => {
    for (const bytes of wholeFiles()) expect(readRecording(bytes, 'whole.csv').ok).toBe(true)
  })

  it('is held against a reader that knows numbers', () => {
    expect(['1,234.5', '-.25', '1e3', '12 345', ''].map((cell) => slowNumber(cell, '.'))).toStrictEqual([
      1234.5,
      -0.25,
      1000,
      12_345,
      NaN,
    ])
  })
})
