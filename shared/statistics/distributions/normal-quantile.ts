import { checkProbability } from './probability.ts'

/** Standard normal density at x. */
function density(x: number): number {
  return Math.exp((-x * x) / 2) / Math.sqrt(2 * Math.PI)
}

/**
 * Share of the standard normal distribution above x ≥ 0: by its series below 2, from there by Laplace's continued
 * fraction (Abramowitz, Stegun 1964, 26.2.11 and 26.2.14), which keeps the digits of a small tail.
 */
export function normalUpperTail(x: number): number {
  if (x < 2) {
    let term = x
    let sum = x
    for (let n = 1; term > sum * Number.EPSILON; n++) {
      term *= (x * x) / (2 * n + 1)
      sum += term
    }
    return 0.5 - density(x) * sum
  }
  let fraction = 0
  for (let n = 80; n > 0; n--) fraction = n / (x + fraction)
  return density(x) / (x + fraction)
}

/**
 * The value x ≥ 0 above which a share `tail` of the standard normal distribution lies, 0 < tail ≤ ½.
 * Rational start (Abramowitz, Stegun 1964, 26.2.23, to 4.5e-4), then Newton's method.
 */
export function normalDeviate(tail: number): number {
  const t = Math.sqrt(-2 * Math.log(tail))
  const above = 2.515517 + t * (0.802853 + t * 0.010328)
  const below = 1 + t * (1.432788 + t * (0.189269 + t * 0.001308))
  let x = Math.max(0, t - above / below)
  for (let step = 0; step < 4; step++) x += (normalUpperTail(x) - tail) / density(x)
  return x
}

/** Quantile of the standard normal distribution: the value below which a share p lies. */
export function normalQuantile(p: number): number {
  checkProbability(p)
  if (p === 0.5) return 0
  return p < 0.5 ? -normalDeviate(p) : normalDeviate(1 - p)
}
