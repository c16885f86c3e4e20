import type { CellKind } from './table.ts'

export type DecimalMark = '.' | ','

/** Digits with a decimal point and an optional exponent: what the language itself reads, and the byte scanner. */
const PLAIN = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/u

/** Marks between thousands besides comma and point: blanks of any width and apostrophes. */
const SPACING = /(?<=\d)['’\u0020\u00A0\u2009\u202F](?=\d{3}(?!\d))/gu

/** Whole thousands marked off in threes, a nought never in front. */
const GROUPED = {
  '.': /^[+-]?[1-9]\d{0,2}(?:,\d{3})+(?:\.\d*)?(?:[eE][+-]?\d+)?$/u,
  ',': /^[+-]?[1-9]\d{0,2}(?:\.\d{3})+(?:,\d*)?(?:[eE][+-]?\d+)?$/u,
} as const
const DECIMAL_COMMA = /^[+-]?(?:\d+,?\d*|,\d+)(?:[eE][+-]?\d+)?$/u

/** A longer number is damage, and reading it would only cost time. */
export const LONGEST_NUMBER = 400

/** Ways in which exports write that a sample is missing. */
const MISSING = new Set([
  '',
  'nan',
  'na',
  'n/a',
  '#n/a',
  'null',
  'none',
  '-',
  '--',
  '.',
  '#nv',
  'inf',
  '-inf',
])

const CLOCK =
  /^(?:(\d{4})-(\d{1,2})-(\d{1,2})[T ])?(\d{1,3}):([0-5]?\d)(?::([0-5]?\d(?:[.,]\d+)?))?(?:Z| ?[+-]\d{2}:?\d{2})?$/u

/** Minutes, seconds and their fraction, as a stopwatch writes them. */
const STOPWATCH = /^(\d{1,3}):([0-5]\d[.,]\d+)$/u

/** The text as the language would write the number, or null where it is none in this way of writing. */
function plainText(text: string, decimal: DecimalMark): string | null {
  // The true minus sign, as typesetters write it.
  let plain = text.startsWith('\u2212') ? `-${text.slice(1)}` : text
  if (PLAIN.test(plain) && (decimal === '.' || !plain.includes('.'))) return plain
  if (plain.length > LONGEST_NUMBER) return null
  plain = plain.replace(SPACING, '')
  if (GROUPED[decimal].test(plain)) plain = plain.replaceAll(decimal === '.' ? ',' : '.', '')
  if (decimal === ',' && DECIMAL_COMMA.test(plain)) plain = plain.replace(',', '.')
  else if (decimal === ',' && plain.includes('.')) return null
  return PLAIN.test(plain) ? plain : null
}

/** The number a cell holds, NaN where it holds none or more than a double can. */
export function readNumber(cell: string, decimal: DecimalMark): number {
  if (cell.length > LONGEST_NUMBER) return NaN
  const plain = plainText(cell.trim(), decimal)
  const value = plain === null ? NaN : Number(plain)
  return Number.isFinite(value) ? value : NaN
}

/** Whether a number is written with marks between its thousands. */
export function hasThousands(cell: string, decimal: DecimalMark): boolean {
  const text = cell.trim()
  return text.replace(SPACING, '') !== text || GROUPED[decimal].test(text)
}

/** Seconds since midnight (since the day 0 of the calendar where a date stands before), NaN for no time of day. */
export function readClock(cell: string): number {
  const stopwatch = STOPWATCH.exec(cell.trim())
  if (stopwatch) return Number(stopwatch[1]) * 60 + Number(stopwatch[2]?.replace(',', '.'))
  const [, year, month, day, hours, minutes, seconds = '0'] = CLOCK.exec(cell.trim()) ?? []
  if (hours === undefined) return NaN
  const days = year === undefined ? 0 : daysBefore(Number(year), Number(month), Number(day))
  return days * 86_400 + Number(hours) * 3600 + Number(minutes) * 60 + Number(seconds.replace(',', '.'))
}

/** Days from 1 March of the year 0 in the Gregorian calendar: only differences are used. */
function daysBefore(year: number, month: number, day: number): number {
  const [y, m] = month > 2 ? [year, month - 3] : [year - 1, month + 9]
  return (
    365 * y +
    Math.floor(y / 4) -
    Math.floor(y / 100) +
    Math.floor(y / 400) +
    Math.floor((153 * m + 2) / 5) +
    day
  )
}

/** What a cell is where numbers have this decimal mark. */
export function cellKind(cell: string, decimal: DecimalMark = '.'): CellKind {
  const text = cell.trim()
  if (PLAIN.test(text) && decimal === '.') return 'number'
  if (MISSING.has(text.toLowerCase())) return 'blank'
  if (text.length <= LONGEST_NUMBER && plainText(text, decimal) !== null) return 'number'
  return CLOCK.test(text) || STOPWATCH.test(text) ? 'clock' : 'text'
}

/** How a table's numbers are written. */
export interface NumberStyle {
  decimal: DecimalMark
  /** Every comma could have stood between thousands as well. */
  assumed: boolean
}

const CANDIDATE = /^[+\-\u2212]?[\d.,'’\u0020\u00A0\u2009\u202F]*\d[.,]?(?:[eE][+-]?\d+)?$/u

/**
 * Whether the decimals of these cells stand behind a point or a comma: by the cells in which a mark can be one thing
 * only (`0,001` and `12,5` have decimals, `1,234,567` and `1,234.5` thousands).
 */
export function numberStyleOf(cells: Iterable<string>): NumberStyle {
  const seen = { point: 0, comma: 0, open: 0 }
  for (const cell of cells) {
    if (!cell.includes(',')) {
      const points = cell.split('.').length - 1
      if (points === 1 && PLAIN.test(cell.trim())) seen.point += GROUPED[','].test(cell.trim()) ? 0 : 1
      else if (points > 1 && GROUPED[','].test(cell.trim())) seen.comma++
      continue
    }
    const text = cell.trim().replace(SPACING, '')
    if (!CANDIDATE.test(text)) continue
    if (GROUPED['.'].test(text)) {
      if (text.includes('.') || text.indexOf(',') !== text.lastIndexOf(',')) seen.point++
      else seen.open++
    } else if (GROUPED[','].test(text) || DECIMAL_COMMA.test(text)) seen.comma++
  }
  if (seen.comma > seen.point) return { decimal: ',', assumed: false }
  if (seen.open > 0 && seen.point === 0) return { decimal: ',', assumed: true }
  return { decimal: '.', assumed: false }
}
