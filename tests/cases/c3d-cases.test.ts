import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { readRecording } from '../../shared/recordings/read-recording.ts'
import { madeC3d } from './c3d/made.ts'
import type { Case } from './case.ts'

const here = join(import.meta.dirname, 'c3d')
const folders = readdirSync(here).filter((name) => /^\d{3}-/u.test(name))

const stored = (folder: string): { bytes: Uint8Array; expected: Case } => ({
  bytes: new Uint8Array(readFileSync(join(here, folder, 'input.c3d'))),
  expected: JSON.parse(readFileSync(join(here, folder, 'expected.json'), 'utf8')) as Case,
})

describe('reading C3D', () => {
  it.each(folders)('%s', (folder) => {
    const { bytes, expected } = stored(folder)
    const result = readRecording(bytes, 'input.c3d')
    if (expected.error) {
      expect(result).toMatchObject({ ok: false, error: expected.error })
      return
    }
    if (!result.ok) throw new Error(`${result.error.code}: ${result.error.sentence}`)
    const { channels, sampleRateHz, filledSamples, notes } = result.recording
    expect({
      sampleRateHz,
      filledSamples,
      channels: Object.fromEntries(Object.entries(channels).map(([name, force]) => [name, [...force]])),
      notes: notes.map(({ code }) => code),
      format: result.format,
    }).toMatchObject({ ...expected.reading })
    // The map as it was taken reads the same file to the same numbers.
    const again = readRecording(bytes, 'input.c3d', { map: result.columnMap })
    expect(again.ok && again.recording.channels).toStrictEqual(channels)
  })

  it('takes feet from a map where the file names none', () => {
    const { bytes, expected } = stored('002-intel-float')
    const total = readRecording(bytes, 'input.c3d')
    if (!total.ok) throw new Error(total.error.sentence)
    const forces = total.columnMap.forces.map((force, i) => ({
      ...force,
      channel: i === 0 ? ('left' as const) : ('right' as const),
    }))
    const read = readRecording(bytes, 'input.c3d', { map: { ...total.columnMap, forces } })
    if (!read.ok) throw new Error(read.error.sentence)
    const { left = [], right = [] } = read.recording.channels
    expect(Array.from(left, (force, i) => force + (right[i] ?? 0))).toStrictEqual(
      expected.reading?.channels.total,
    )
    expect(read.notes).toStrictEqual([])
  })

  it('asks for a map of three plates, and shows them', () => {
    const result = readRecording(stored('022-three-plates').bytes, 'input.c3d')
    if (result.ok) throw new Error('It was read.')
    expect(result.needsMap?.preview.headings).toStrictEqual([
      'Time (s)',
      'Plate 1 Fz (N)',
      'Plate 2 Fz (N)',
      'Plate 3 Fz (N)',
    ])
  })

  it.each(madeC3d)('$folder lies there as it is made', ({ folder, bytes, expected }) => {
    expect(Buffer.compare(stored(folder).bytes, bytes)).toBe(0)
    expect(stored(folder).expected).toStrictEqual(JSON.parse(JSON.stringify(expected)))
  })
})
