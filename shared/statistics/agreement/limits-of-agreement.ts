import { tInterval, type Estimate } from '../estimate.ts'
import { tooFew, type Missing } from '../missing.ts'
import { mean } from '../summary/mean.ts'
import { standardDeviation } from '../summary/standard-deviation.ts'

export interface LimitsOfAgreement {
  /** Mean of first − second. */
  bias: Estimate
  /** Standard deviation of the differences. */
  sd: number
  lower: Estimate
  upper: Estimate
}

/**
 * Limits between which about 95 % of the differences of two methods lie: bias ± multiplier·SD, each with its interval
 * for `coverage`, standard errors SD/√n and √(3/n)·SD, t with n − 1 (Bland, Altman 1986, Lancet i:307–310, who print
 * 2 for the multiplier; 1.96 since). `first` and `second` are of the same subjects in the same order.
 */
export function limitsOfAgreement(
  first: readonly number[],
  second: readonly number[],
  { multiplier = 1.96, coverage = 0.95 } = {},
): LimitsOfAgreement | Missing {
  const n = first.length
  if (n !== second.length) return { missing: 'unequal-lengths' }
  if (n < 2) return tooFew(n, 2)
  const differences = first.map((value, i) => value - second[i])
  const bias = mean(differences)
  const sd = standardDeviation(differences)
  if (bias === null || sd === null) return { missing: 'not-finite' }
  const limit = (at: number) => tInterval(at, Math.sqrt(3 / n) * sd, n - 1, coverage)
  return {
    bias: tInterval(bias, sd / Math.sqrt(n), n - 1, coverage),
    sd,
    lower: limit(bias - multiplier * sd),
    upper: limit(bias + multiplier * sd),
  }
}
