/** Stands for a zero denominator, as Lentz's method asks. */
const TINY = 1e-300
/** Terms grow with the root of the parameters: enough for a million degrees of freedom. */
const MOST_TERMS = 100_000

/**
 * Continued fraction b₀ + a₁/(b₁ + a₂/(b₂ + …)) by the modified method of Lentz (Thompson, Barnett 1986, J Comput
 * Phys 64:490–509). `a(j)`, `b(j)` give the j-th partial numerator and denominator. NaN where it does not settle.
 */
export function continuedFraction(a: (j: number) => number, b: (j: number) => number): number {
  let value = b(0) || TINY
  let c = value
  let d = 0
  for (let j = 1; j <= MOST_TERMS; j++) {
    d = 1 / (b(j) + a(j) * d || TINY)
    c = b(j) + a(j) / c || TINY
    const step = c * d
    value *= step
    if (Math.abs(step - 1) < Number.EPSILON) return value
  }
  return NaN
}
