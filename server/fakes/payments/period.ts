import type { Interval } from './shapes.ts'

/**
 * The end of the period that holds or begins at `startS`: the anchor's day of the month, or the month's last day
 * where it has no such day (31 January, 28 February, 31 March …).
 */
export function periodEnd(anchorS: number, startS: number, interval: Interval): number {
  const anchor = new Date(anchorS * 1000)
  const start = new Date(startS * 1000)
  const months = interval === 'year' ? 12 : 1
  const end = new Date(anchor)
  end.setUTCDate(1)
  end.setUTCFullYear(start.getUTCFullYear(), start.getUTCMonth() + months, 1)
  const lastDay = new Date(Date.UTC(end.getUTCFullYear(), end.getUTCMonth() + 1, 0)).getUTCDate()
  end.setUTCDate(Math.min(anchor.getUTCDate(), lastDay))
  return Math.floor(end.getTime() / 1000)
}
