import { tooFew, type Missing } from '../missing.ts'

/** All in the unit of the values. */
export interface CusumOptions {
  target: number
  /** k: what a value may be off without adding up; half the shift to be found, often half a standard deviation. */
  slack: number
  /** h: the sum that signals a shift; often 4 to 5 standard deviations. */
  limit: number
}

export interface CusumPoint {
  value: number
  /** Sums of what lies above the target by more than the slack, and of what lies below. Neither falls under zero. */
  above: number
  below: number
  signal: 'rise' | 'fall' | null
}

/**
 * Two one-sided cumulative sums S⁺ = max(0, S⁺ + x − target − k) and S⁻ = max(0, S⁻ + target − k − x); a signal where
 * one passes h (NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.3). The sums go on after a signal.
 */
export function cusumChart(
  values: readonly number[],
  { target, slack, limit }: CusumOptions,
): CusumPoint[] | Missing {
  if (values.length === 0) return tooFew(0, 1)
  if (![...values, target, slack, limit].every(Number.isFinite)) return { missing: 'not-finite' }
  let above = 0
  let below = 0
  return values.map((value) => {
    above = Math.max(0, above + (value - target) - slack)
    below = Math.max(0, below + (target - value) - slack)
    return { value, above, below, signal: above > limit ? 'rise' : below > limit ? 'fall' : null }
  })
}
