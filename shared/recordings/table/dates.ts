const MONTHS = 'jan feb mar apr may jun jul aug sep oct nov dec'.split(' ')

const TIME = /(?:^|[\sT])([01]?\d|2[0-3]):([0-5]\d)(?::([0-5]\d))?(?:\.\d+)?(?:\s*([ap])m)?/iu

function isoDate(year: number, month: number, day: number): string | null {
  const days = [
    31,
    year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0) ? 29 : 28,
    31,
    30,
    31,
    30,
    31,
    31,
    30,
    31,
    30,
    31,
  ]
  if (year < 1980 || year > 2100 || day < 1 || day > (days[month - 1] ?? 0)) return null
  return `${year}-${String(month).padStart(2, '0')}-${String(day).padStart(2, '0')}`
}

/** Day and month where only one order is possible, or where a point says that the day stands first. */
function ordered(a: number, b: number, year: number, mark: string): string | null {
  if (mark === '.' || a > 12) return isoDate(year, b, a)
  if (b > 12 || a === b) return isoDate(year, a, b)
  return null
}

function dateIn(text: string): string | null {
  const iso = /\b(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})(?!\d)/u.exec(text)
  if (iso) return isoDate(Number(iso[1]), Number(iso[2]), Number(iso[3]))
  const packed = /^\s*(\d{4})(\d{2})(\d{2})\b/u.exec(text)
  if (packed) return isoDate(Number(packed[1]), Number(packed[2]), Number(packed[3]))
  const numbers = /\b(\d{1,2})([./-])(\d{1,2})\2(\d{4})\b/u.exec(text)
  if (numbers) return ordered(Number(numbers[1]), Number(numbers[3]), Number(numbers[4]), numbers[2] ?? '')
  const named = /\b(\d{1,2})\.?[ -]([a-z]{3})[a-z]*\.?[ -](\d{4})\b/iu.exec(text)
  if (named)
    return isoDate(Number(named[3]), MONTHS.indexOf((named[2] ?? '').toLowerCase()) + 1, Number(named[1]))
  const american = /\b([a-z]{3})[a-z]*\.? (\d{1,2}),? (\d{4})\b/iu.exec(text)
  if (american)
    return isoDate(
      Number(american[3]),
      MONTHS.indexOf((american[1] ?? '').toLowerCase()) + 1,
      Number(american[2]),
    )
  return null
}

/**
 * A date, with the time of day where it is written, as ISO 8601 without a zone. null for none, and where day and
 * month could be swapped (03/04/2026).
 */
export function readDate(text: string): string | null {
  const date = dateIn(text)
  if (date === null) return null
  const [whole, hours, minutes, seconds = '00', half] = TIME.exec(text) ?? []
  if (whole === undefined) return date
  const hour = half ? (Number(hours) % 12) + (half.toLowerCase() === 'p' ? 12 : 0) : Number(hours)
  return `${date}T${String(hour).padStart(2, '0')}:${minutes ?? ''}:${seconds}`
}
