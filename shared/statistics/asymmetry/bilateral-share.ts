import { areMagnitudes } from './two-sides.ts'

/**
 * Difference of the two shares of the whole, (R − L)/(R + L)·100 %, above zero where the right side is larger; half the
 * symmetry index (Bishop et al. 2016, Strength Cond J, bilateral asymmetry index). −100 to 100. null unless both sides
 * are magnitudes.
 */
export function bilateralShare(left: number, right: number): number | null {
  return areMagnitudes(left, right) ? (100 * (right - left)) / (right + left) : null
}
