import { tInterval } from '../estimate.ts'
import { tooFew, type Missing } from '../missing.ts'
import { mean } from '../summary/mean.ts'
import { standardDeviation } from '../summary/standard-deviation.ts'

export interface PredictionScore {
  /** (x − x̄)/s, as if the baseline's mean and spread were known exactly. */
  z: number
  /** (x − x̄)/(s·√(1 + 1/n)): Student's t with `dof`, which allows for how little a short baseline knows of either. */
  t: number
  dof: number
  /** Limits of the prediction interval for the next value. */
  low: number
  high: number
  outside: boolean
}

/** Sessions below which a baseline says too little (common practice). */
const FEWEST_SESSIONS = 5

/**
 * How far a new value lies from a baseline, and the interval x̄ ± t·s·√(1 + 1/n) in which the next one falls with the
 * given `coverage` (Hahn, Meeker 1991, Statistical Intervals, ch. 4). The baseline must not hold the value itself. A
 * trend in it, or sessions that hang together, raise false alarms.
 */
export function predictionScore(
  baseline: readonly number[],
  value: number,
  { coverage = 0.95, fewest = FEWEST_SESSIONS } = {},
): PredictionScore | Missing {
  const n = baseline.length
  const needed = Math.max(2, fewest)
  if (n < needed) return tooFew(n, needed)
  const centre = mean(baseline)
  const sd = standardDeviation(baseline)
  if (centre === null || sd === null || !Number.isFinite(value)) return { missing: 'not-finite' }
  if (sd === 0) return { missing: 'no-spread' }
  const error = sd * Math.sqrt(1 + 1 / n)
  const { low, high } = tInterval(centre, error, n - 1, coverage)
  return {
    z: (value - centre) / sd,
    t: (value - centre) / error,
    dof: n - 1,
    low,
    high,
    outside: value < low || value > high,
  }
}
