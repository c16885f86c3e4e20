import { continuedFraction } from './continued-fraction.ts'
import { deviance } from './deviance.ts'
import { stirlingError } from './stirling-error.ts'

/** xᵃ·e⁻ˣ / Γ(a): the density of a gamma variate's logarithm. a > 0, x ≥ 0. */
export function gammaLogDensity(a: number, x: number): number {
  if (x === 0) return 0
  return Math.sqrt(a / (2 * Math.PI)) * Math.exp(-stirlingError(a) - deviance(a, x))
}

/** Terms that a million degrees of freedom, and a hundred times as many, do not need. */
const MOST_TERMS = 100_000

/** Lower share by the series Σ xⁿ/((a + 1)…(a + n)) (Abramowitz, Stegun 1964, 6.5.29): fast for x below a + 1. NaN where it does not settle. */
function lowerSeries(a: number, x: number): number {
  let term = 1
  let sum = 1
  let n = 1
  for (; term > sum * Number.EPSILON && n < MOST_TERMS; n++) {
    term *= x / (a + n)
    sum += term
  }
  return n < MOST_TERMS ? (gammaLogDensity(a, x) / a) * sum : NaN
}

/** Upper share by the continued fraction (DLMF 8.9.2, even part): fast for x above a + 1. */
function upperFraction(a: number, x: number): number {
  const numerator = (j: number) => (j === 1 ? 1 : -(j - 1) * (j - 1 - a))
  const denominator = (j: number) => (j === 0 ? 0 : x + 2 * j - 1 - a)
  return gammaLogDensity(a, x) * continuedFraction(numerator, denominator)
}

/** Regularised lower incomplete gamma function P(a, x), the share of a gamma variate of shape a > 0 below x. */
export function lowerGamma(a: number, x: number): number {
  if (x <= 0) return 0
  return x < a + 1 ? lowerSeries(a, x) : 1 - upperFraction(a, x)
}

/** Regularised upper incomplete gamma function Q(a, x) = 1 − P(a, x), precise where it is small. */
export function upperGamma(a: number, x: number): number {
  if (x <= 0) return 1
  return x < a + 1 ? 1 - lowerSeries(a, x) : upperFraction(a, x)
}
