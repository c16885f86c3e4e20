import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { readErrorCodes } from '../../shared/recordings/errors.ts'
import { readRecording } from '../../shared/recordings/read-recording.ts'
import type { Case } from './case.ts'
import { madeCases } from './make/all.ts'

const here = import.meta.dirname
const folders = readdirSync(here, { withFileTypes: true })
  .filter((entry) => entry.isDirectory() && /^\d{3}-/u.test(entry.name))
  .map((entry) => entry.name)
  .sort()

function load(folder: string): { expected: Case; bytes: Uint8Array; fileName: string } {
  const expected = JSON.parse(readFileSync(join(here, folder, 'expected.json'), 'utf8')) as Case
  const stored = readdirSync(join(here, folder)).find((name) => name.startsWith('input.'))
  if (expected.input) return { expected, bytes: made(expected.input), fileName: 'made.csv' }
  if (!stored) throw new Error(`The case ${folder} has no input.`)
  const bytes = new Uint8Array(readFileSync(join(here, folder, stored)))
  return { expected, bytes, fileName: expected.fileName ?? stored }
}

function made({ head, repeat, bytes }: NonNullable<Case['input']>): Uint8Array {
  const out = Buffer.alloc(bytes, repeat)
  out.write(head)
  return out
}

/** Errors of archives and of binary recordings, which their own tests prove. */
const provedElsewhere = /archive|packing|plate-type/u

describe('reading', () => {
  it.each(folders)('%s', (folder) => {
    const { expected, bytes, fileName } = load(folder)
    const before = bytes.slice(0, 4096)
    const result = readRecording(bytes, fileName, expected.hints)
    expect(bytes.slice(0, 4096)).toStrictEqual(before)
    if (expected.error) {
      if (result.ok) throw new Error('The file was read, and an error was expected.')
      expect(result.error).toMatchObject(expected.error)
      expect(result.error.sentence).toMatch(/^[A-Z0-9].*\.$/u)
      expect(result.error.remedy).toMatch(/\.$/u)
      if (expected.proposal) expect(result.needsMap?.proposal.map).toMatchObject(expected.proposal)
      return
    }
    if (!result.ok) throw new Error(`${result.error.code}: ${result.error.sentence}`)
    const { channels, notes, ...rest } = result.recording
    expect({
      sampleRateHz: rest.sampleRateHz,
      filledSamples: rest.filledSamples,
      channels: Object.fromEntries(Object.entries(channels).map(([name, force]) => [name, [...force]])),
      notes: notes.map((note) => note.code),
    }).toStrictEqual({
      sampleRateHz: expected.reading?.sampleRateHz,
      filledSamples: expected.reading?.filledSamples,
      channels: expected.reading?.channels,
      notes: expected.reading?.notes,
    })
    if (expected.reading?.format) expect(result.format).toMatchObject(expected.reading.format)
    if (expected.reading?.forces) expect(result.columnMap.forces).toMatchObject(expected.reading.forces)
    if (expected.reading?.time) expect(result.columnMap.time).toMatchObject(expected.reading.time)
    if (expected.reading?.metadata) expect(result.metadata).toStrictEqual(expected.reading.metadata)
    // The map as it was taken reads the same file to the same numbers.
    const again = readRecording(bytes, fileName, { ...expected.hints, map: result.columnMap })
    expect(again.ok && again.recording.channels).toStrictEqual(channels)
  })

  it.each(madeCases)('$folder lies there as it is made', ({ folder, bytes, expected }) => {
    const stored = load(folder)
    expect(Buffer.compare(stored.bytes, bytes)).toBe(0)
    expect(stored.expected).toStrictEqual(JSON.parse(JSON.stringify(expected)))
  })

  it('has a case for every error that the catalogue knows', () => {
    const met = new Set(folders.map((folder) => load(folder).expected.error?.code))
    expect(readErrorCodes.filter((code) => !met.has(code) && !provedElsewhere.test(code))).toStrictEqual([])
  })
})
