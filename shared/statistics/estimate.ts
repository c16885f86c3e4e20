import { tQuantile } from './distributions/t-quantile.ts'

/** An estimate with the limits of its confidence interval, all in the unit of the estimate. */
export interface Estimate {
  value: number
  low: number
  high: number
}

/** value ± t·SE, t of Student's distribution for a two-sided `coverage` (0 to 1). */
export function tInterval(value: number, standardError: number, dof: number, coverage: number): Estimate {
  const half = standardError * tQuantile((1 + coverage) / 2, dof)
  return { value, low: value - half, high: value + half }
}
