/** Below this the argument is first moved up, where the asymptotic series has 16 digits. */
const SERIES_FROM = 10

/**
 * What Stirling's formula lacks of the log-gamma function:
 * δ(x) = ln Γ(x) − [(x − ½)·ln x − x + ½·ln 2π], for x > 0.
 * Series in Bernoulli numbers (Abramowitz, Stegun 1964, 6.1.41); below 10 by δ(x) = δ(x + 1) + (x + ½)·ln(1 + 1/x) − 1.
 * Densities written with δ keep their digits where large log-gammas would cancel (Loader 2000, Fast and accurate
 * computation of binomial probabilities).
 */
export function stirlingError(x: number): number {
  let moved = 0
  let y = x
  while (y < SERIES_FROM) {
    moved += (y + 0.5) * Math.log1p(1 / y) - 1
    y++
  }
  const z = 1 / (y * y)
  const series =
    1 / 12 -
    z * (1 / 360 - z * (1 / 1260 - z * (1 / 1680 - z * (1 / 1188 - z * (691 / 360360 - z * (1 / 156))))))
  return moved + series / y
}
