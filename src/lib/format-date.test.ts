import { describe, expect, test } from 'vitest'
import { formatDate, formatDateShort, formatMoment, todayIn } from './format-date.ts'

describe('dates', () => {
  test('a calendar date is the same day wherever it is read', () => {
    expect(formatDate('2026-11-01')).toBe('1 November 2026')
    expect(formatDateShort('2026-11-01')).toBe('1 Nov 2026')
  })
  test('a moment is shown in the time zone of the club', () => {
    expect(formatMoment('2026-11-01T23:30:00.000Z', 'Europe/Helsinki')).toBe('2 Nov 2026, 01:30')
  })
  test('today is the day of the club, not of the browser', () => {
    const lateInUtc = new Date('2026-11-01T23:30:00.000Z')
    expect(todayIn('Europe/Helsinki', lateInUtc)).toBe('2026-11-02')
    expect(todayIn('America/Lima', lateInUtc)).toBe('2026-11-01')
  })
})
