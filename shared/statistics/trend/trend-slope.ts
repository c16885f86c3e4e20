import type { Missing } from '../missing.ts'
import { isMissing } from '../missing.ts'
import { linearRegression, type Coefficient } from './linear-regression.ts'

export interface Trend {
  /** Change per unit of time: of the values' unit a day where times are days. */
  slope: Coefficient
  /** Sessions behind it. */
  n: number
  /** Which way it goes, or null where zero lies within the interval. */
  direction: 'rise' | 'fall' | null
}

function directionOf({ low, high }: Coefficient): Trend['direction'] {
  if (low > 0) return 'rise'
  return high < 0 ? 'fall' : null
}

/**
 * Slope of results over time with its interval (ordinary least squares). At least three sessions on two days. Results of
 * neighbouring days that hang together make the true interval wider than this one.
 */
export function trendSlope(
  times: readonly number[],
  values: readonly number[],
  coverage = 0.95,
): Trend | Missing {
  const fit = linearRegression(times, values, coverage)
  if (isMissing(fit)) return fit
  return { slope: fit.slope, n: fit.n, direction: directionOf(fit.slope) }
}
