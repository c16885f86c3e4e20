import { describe, expect, it } from 'vitest'
import { lastYear } from './last-year.ts'

const on = (...dates: string[]) => dates.map((date) => ({ date }))

describe('lastYear(results, until)', () => {
  it('keeps the day a year ago and the day itself, and leaves out what lies before and after', () => {
    const results = on('2025-11-11', '2025-11-12', '2026-05-01', '2026-11-12', '2026-11-13')
    expect(lastYear(results, '2026-11-12')).toEqual(on('2025-11-12', '2026-05-01', '2026-11-12'))
  })

  it('knows a leap day’s year before as the days from 29 February on', () => {
    expect(lastYear(on('2023-02-28', '2023-03-01'), '2024-02-29')).toEqual(on('2023-03-01'))
  })

  it('gives nothing for nothing', () => {
    expect(lastYear([], '2026-11-12')).toEqual([])
  })
})
