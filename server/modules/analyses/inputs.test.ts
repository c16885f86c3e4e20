import { describe, expect, it } from 'vitest'
import { engineOptions, hashInputs, inputsOf, type TrialToAnalyse } from './inputs.ts'

const trial: TrialToAnalyse = {
  test: { protocol: 'cmj', side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips' },
  recordedMassKg: 71,
  channels: ['left', 'right'],
  movedEvents: null,
}
const samples = Uint8Array.of(1, 2, 3)
const hash = (change: Partial<TrialToAnalyse> = {}, bytes = samples) =>
  hashInputs(inputsOf({ ...trial, ...change }), bytes).toString('hex')

describe('the hash of an analysis’s inputs', () => {
  it('is the same for the same inputs, in whatever order their keys stand', () => {
    const { arms, boxHeightM, externalLoadKg, protocol, side } = trial.test
    expect(hash({ test: { arms, side, boxHeightM, protocol, externalLoadKg } })).toBe(hash())
  })

  it.each([
    ['the test', hash({ test: { ...trial.test, externalLoadKg: 20 } })],
    ['the recorded mass', hash({ recordedMassKg: 72 })],
    ['no recorded mass', hash({ recordedMassKg: null })],
    ['the plates', hash({ channels: ['total'] })],
    ['a moved event', hash({ movedEvents: { takeoff: 1.5 } })],
    ['the samples', hash({}, Uint8Array.of(1, 2, 4))],
  ])('is another for %s', (_, other) => {
    expect(other).not.toBe(hash())
  })
})

describe('a trial whose events nobody moved', () => {
  it('has the hash that it had before events could be moved', () => {
    expect(hash({ movedEvents: {} })).toBe(hash())
    expect(inputsOf(trial)).not.toHaveProperty('movedEvents')
    expect(engineOptions(inputsOf(trial))).not.toHaveProperty('movedEvents')
  })
})

describe('what the engine is given', () => {
  it('names no mass where none is recorded', () => {
    expect(engineOptions(inputsOf({ ...trial, recordedMassKg: null }))).not.toHaveProperty('recordedMassKg')
  })

  it('has the moved events', () => {
    const movedEvents = { takeoff: 1.5, still: 3 }
    expect(engineOptions(inputsOf({ ...trial, movedEvents }))).toMatchObject({ movedEvents })
  })

  it('takes half a percent for each plate and standard gravity', () => {
    expect(engineOptions(inputsOf(trial))).toMatchObject({
      gravity: 9.80665,
      calibrationU: { left: 0.005, right: 0.005 },
      recordedMassKg: 71,
    })
  })
})
