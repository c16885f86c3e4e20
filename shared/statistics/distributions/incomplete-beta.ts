import { continuedFraction } from './continued-fraction.ts'
import { deviance } from './deviance.ts'
import { stirlingError } from './stirling-error.ts'

/**
 * xᵃ·(1 − x)ᵇ / B(a, b): the density of a beta variate's logit. `y` is 1 − x, given apart so that both ends keep
 * their digits. a, b > 0.
 */
export function betaLogitDensity(a: number, b: number, x: number, y: number): number {
  if (x === 0 || y === 0) return 0
  const sum = a + b
  const exponent =
    stirlingError(sum) - stirlingError(a) - stirlingError(b) - deviance(a, sum * x) - deviance(b, sum * y)
  return Math.sqrt((a / sum) * (b / (2 * Math.PI))) * Math.exp(exponent)
}

/**
 * Regularised incomplete beta function Iₓ(a, b), the share of a beta variate below x. `y` is 1 − x.
 * Continued fraction of Abramowitz, Stegun 1964, 26.5.8 (DLMF 8.17.22), on the side of the mean where it converges fast.
 */
export function incompleteBeta(a: number, b: number, x: number, y: number): number {
  if (x <= 0) return 0
  if (y <= 0) return 1
  if (x > (a + 1) / (a + b + 2)) return 1 - incompleteBeta(b, a, y, x)
  const numerator = (j: number) => {
    if (j === 1) return 1
    const m = (j - 1) >> 1
    return j % 2 === 1
      ? (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m))
      : (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1))
  }
  return (betaLogitDensity(a, b, x, y) / a) * continuedFraction(numerator, (j) => (j === 0 ? 0 : 1))
}
