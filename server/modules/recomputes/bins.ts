import type { Bins } from '../../db/schema/recomputes.ts'

const step = Math.log(1.02)

/** Counts a positive size; of zero nothing can be said on a scale of ratios, and nothing is counted. */
export function countSize(bins: Bins, size: number): void {
  if (!(size > 0 && Number.isFinite(size))) return
  const bin = Math.floor(Math.log(size) / step)
  bins[bin] = (bins[bin] ?? 0) + 1
}

/** The median of what was counted, right to 1 %; null of nothing. */
export function medianOf(bins: Bins): number | null {
  const counted = Object.entries(bins).map(([bin, count]) => [Number(bin), count] as const)
  const total = counted.reduce((sum, [, count]) => sum + count, 0)
  let below = 0
  for (const [bin, count] of counted.sort(([a], [b]) => a - b)) {
    below += count
    if (2 * below >= total) return Math.exp((bin + 0.5) * step)
  }
  return null
}

export function addBins(to: Bins, from: Bins): void {
  for (const [bin, count] of Object.entries(from)) to[bin] = (to[bin] ?? 0) + count
}
