import type { NumberKind } from './number-format.ts'

const DAY_S = 86_400

/** Days from the day 0 of a workbook's calendar to 1970-01-01: the usual one (1899-12-30), and that of 1904. */
const DAYS_TO_1970 = { usual: 25_569, from1904: 24_107 }

const padded = (value: number, length = 2): string => String(value).padStart(length, '0')

/** `2026-12-01` of a day counted from 1970-01-01, by the Gregorian calendar's cycle of 146,097 days in 400 years. */
function dateText(day: number): string {
  const shifted = day + 719_468
  const era = Math.floor(shifted / 146_097)
  const dayOfEra = shifted - era * 146_097
  const yearOfEra = Math.floor(
    (dayOfEra -
      Math.floor(dayOfEra / 1460) +
      Math.floor(dayOfEra / 36_524) -
      Math.floor(dayOfEra / 146_096)) /
      365,
  )
  const dayOfYear = dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100))
  // The year begins in March, so that a leap day is its last.
  const monthFromMarch = Math.floor((5 * dayOfYear + 2) / 153)
  const dayOfMonth = dayOfYear - Math.floor((153 * monthFromMarch + 2) / 5) + 1
  const month = monthFromMarch < 10 ? monthFromMarch + 3 : monthFromMarch - 9
  const year = yearOfEra + 400 * era + (month <= 2 ? 1 : 0)
  return `${padded(year, 4)}-${padded(month)}-${padded(dayOfMonth)}`
}

/** `10:32:15.001500`, to a microsecond: stamps of 2000 Hz need half a millisecond. */
function timeText(microseconds: number): string {
  const seconds = Math.floor(microseconds / 1e6)
  const [h, m, s] = [Math.floor(seconds / 3600), Math.floor(seconds / 60) % 60, seconds % 60]
  return `${padded(h)}:${padded(m)}:${padded(s)}.${padded(microseconds % 1e6, 6)}`
}

/**
 * A workbook's number of days as the text of the date or time that it stands for. A time of more than a day keeps
 * its hours.
 */
export function dayNumberText(days: number, kind: Exclude<NumberKind, 'number'>, is1904: boolean): string {
  if (kind === 'time') return timeText(Math.max(0, Math.round(days * DAY_S * 1e6)))
  // Rounded as a whole, so that a moment before midnight does not lose its day.
  const microseconds = Math.round(days * DAY_S * 1e6)
  const day = Math.floor(microseconds / (DAY_S * 1e6))
  const date = dateText(day - (is1904 ? DAYS_TO_1970.from1904 : DAYS_TO_1970.usual))
  return kind === 'date' ? date : `${date}T${timeText(microseconds - day * DAY_S * 1e6)}`
}
