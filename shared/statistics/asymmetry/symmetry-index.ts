import { areMagnitudes } from './two-sides.ts'

/**
 * Symmetry index (R − L)/(½·(R + L))·100 %, above zero where the right side is larger (Robinson, Herzog, Nigg 1987, J
 * Manipulative Physiol Ther 10:172–176). −200 to 200. null unless both sides are magnitudes.
 */
export function symmetryIndex(left: number, right: number): number | null {
  return areMagnitudes(left, right) ? (200 * (right - left)) / (right + left) : null
}
