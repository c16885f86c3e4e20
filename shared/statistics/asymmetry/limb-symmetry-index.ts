import { areMagnitudes } from './two-sides.ts'

/**
 * Limb symmetry index involved/uninvolved·100 %: 100 where both are alike. The reading of 90 as a limit is a clinical
 * convention, not a finding (common practice). null where the uninvolved side is zero, or either is no magnitude.
 */
export function limbSymmetryIndex(involved: number, uninvolved: number): number | null {
  return areMagnitudes(involved, uninvolved) && uninvolved > 0 ? (100 * involved) / uninvolved : null
}
