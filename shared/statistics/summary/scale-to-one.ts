/** Values divided by a power of two, which costs no digit. */
export interface Scaled {
  values: number[]
  factor: number
}

/** The largest exponent whose power of two is still a number. */
const GREATEST_EXPONENT = 1023

/**
 * Brings the largest magnitude to between 1 and 2, so that squares of huge or tiny values neither overflow nor vanish.
 * null of nothing, and where a value is not finite.
 */
export function scaleToOne(values: readonly number[]): Scaled | null {
  let largest = 0
  for (const value of values) {
    if (!Number.isFinite(value)) return null
    largest = Math.max(largest, Math.abs(value))
  }
  if (values.length === 0) return null
  const exponent = largest > 0 ? Math.min(GREATEST_EXPONENT, Math.floor(Math.log2(largest))) : 0
  const factor = 2 ** exponent
  return { values: values.map((value) => value / factor), factor }
}
