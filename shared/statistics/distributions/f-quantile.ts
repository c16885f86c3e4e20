import { chiSquaredQuantile } from './chi-squared-quantile.ts'
import { betaLogitDensity, incompleteBeta } from './incomplete-beta.ts'
import { invertShare } from './invert-share.ts'
import { checkProbability } from './probability.ts'

/**
 * Natural logarithm of the odds x/(1 − x) of a beta variate below which a share p lies; a, b > 0, and p at most ½.
 * As odds, neither end of the variate's range loses digits.
 */
function lowerBetaLogit(p: number, a: number, b: number): number {
  const x = (u: number) => 1 / (1 + Math.exp(-u))
  return invertShare(
    p,
    (u) => incompleteBeta(a, b, x(u), x(-u)),
    (u) => betaLogitDensity(a, b, x(u), x(-u)),
    Math.log(a / b),
  )
}

/** As `fQuantile`, from the share `tail` above the value: keeps the digits of a small one. */
export function fUpperQuantile(tail: number, between: number, within: number): number {
  return 1 / fQuantile(tail, within, between)
}

/**
 * Quantile of the F distribution with `between` and `within` degrees of freedom: the value below which a share p lies.
 * F·between/within are the odds of a beta variate (Abramowitz, Stegun 1964, 26.6.2). Either may be infinite, not both.
 */
export function fQuantile(p: number, between: number, within: number): number {
  checkProbability(p, between, within)
  if (within === Infinity) return chiSquaredQuantile(p, between) / between
  if (between === Infinity) return within / chiSquaredQuantile(1 - p, within)
  if (p > 0.5) return fUpperQuantile(1 - p, between, within)
  return Math.exp(lowerBetaLogit(p, between / 2, within / 2)) * (within / between)
}
