import { describe, expect, it } from 'vitest'
import { readDate } from './dates.ts'
import { readMetadata } from './metadata.ts'
import type { TopRow } from './table.ts'

const rows = (...lines: string[][]): TopRow[] =>
  lines.map((cells, i) => ({ cells, kinds: cells.map(() => 'text' as const), line: i + 1 }))

describe('readMetadata', () => {
  it('reads rate, date, athlete, mass and test however they are laid out', () => {
    expect(
      readMetadata(
        rows(
          ['# Sampling rate (Hz): 1000'],
          ['Date', '2026-11-03', '10:32:15'],
          ['Athlete:', 'Ada Invented'],
          ['Körpermasse', '81,5', 'kg'],
          ['Test = countermovement jump'],
          ['Operator', 'nobody'],
        ),
        '.',
      ),
    ).toStrictEqual({
      sampleRateHz: 1000,
      recordedAt: '2026-11-03T10:32:15',
      athlete: 'Ada Invented',
      bodyMassKg: 81.5,
      test: 'countermovement jump',
      lines: [1, 2, 3, 4, 5],
    })
  })

  it('puts the time of day of a line of its own beside the date', () => {
    expect(readMetadata(rows(['Date: 03.11.2026'], ['Time: 9:05']), '.').recordedAt).toBe(
      '2026-11-03T09:05:00',
    )
  })

  it.each([
    ['a weight without a unit', ['Weight', '81']],
    ['a mass no person has', ['Mass', '4 kg']],
    ['a rate in another unit', ['Rate', '12 1/min']],
    ['a rate no plate has', ['Rate', '2 Hz']],
    ['a sentence', ['Rate of the plates see manual']],
  ])('does not take %s', (_, line) => {
    expect(readMetadata(rows(line), '.')).toStrictEqual({ lines: [] })
  })

  it('takes the first line that says a thing, and keeps frames and samples apart', () => {
    const read = readMetadata(rows(['Rate: 1 kHz'], ['Rate: 500 Hz'], ['Frame rate: 100']), '.')
    expect(read).toMatchObject({ sampleRateHz: 1000, frameRateHz: 100 })
  })

  it('turns a weight in newtons or pounds into kilograms', () => {
    expect(readMetadata(rows(['Weight: 784.532 N']), '.').bodyMassKg).toBeCloseTo(80, 9)
    expect(readMetadata(rows(['Weight (lb): 180']), '.').bodyMassKg).toBeCloseTo(81.6466, 4)
  })
})

describe('readDate', () => {
  it.each([
    ['2026-11-03T10:32:15.250', '2026-11-03T10:32:15'],
    ['2026/11/3', '2026-11-03'],
    ['20261103', '2026-11-03'],
    ['03.11.2026', '2026-11-03'],
    ['23/11/2026 4:05 pm', '2026-11-23T16:05:00'],
    ['11/23/2026', '2026-11-23'],
    ['3 Nov 2026', '2026-11-03'],
    ['November 3, 2026', '2026-11-03'],
    ['03/11/2026', null],
    ['31.02.2026', null],
    ['yesterday', null],
  ])('reads %s as %s', (text, iso) => {
    expect(readDate(text)).toBe(iso)
  })
})
