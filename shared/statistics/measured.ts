/** A figure with its expanded uncertainty for about 95 %, in its unit; null where it is not known. */
export interface Measured {
  value: number
  U: number | null
}

/** Whether a ratio can be made of all of these. */
export function arePositive(...figures: readonly Measured[]): boolean {
  return figures.every(({ value }) => value > 0 && value < Infinity)
}

/**
 * Uncertainty of a figure from those of what it is made of, to first order (GUM, JCGM 100:2008, 5.1.2): √Σ(c·U)², each
 * with its sensitivity c. Inputs must be independent: for a comparison within one plate give the repeatable part alone.
 * null where one of them is.
 */
export function combineU(
  parts: readonly (readonly [sensitivity: number, U: number | null])[],
): number | null {
  let squares = 0
  for (const [sensitivity, U] of parts) {
    if (U === null) return null
    squares += (sensitivity * U) ** 2
  }
  return Math.sqrt(squares)
}
