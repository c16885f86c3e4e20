/** Share of their sum within which two numbers count as close: there the direct formula would cancel. */
const CLOSE = 0.1

/**
 * Deviance x·ln(x/m) + m − x for x, m > 0, to full precision where the two are close: with v = (x − m)/(x + m),
 * (x − m)·v + 2x·Σ v^(2j+1)/(2j + 1), j ≥ 1 (Loader 2000, Fast and accurate computation of binomial probabilities).
 */
export function deviance(x: number, m: number): number {
  if (!(Math.abs(x - m) < CLOSE * (x + m))) return x * Math.log(x / m) + m - x
  const v = (x - m) / (x + m)
  let power = 2 * x * v
  let sum = (x - m) * v
  for (let j = 1; ; j++) {
    power *= v * v
    const next = sum + power / (2 * j + 1)
    if (next === sum) return sum
    sum = next
  }
}
