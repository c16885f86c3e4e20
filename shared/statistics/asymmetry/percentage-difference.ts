import { areMagnitudes } from './two-sides.ts'

/**
 * Difference as a percentage of one side, signed by the larger side: above zero where it is the right. Of the stronger,
 * (S − K)/S·100 % (Impellizzeri et al. 2007, Med Sci Sports Exerc 39:2044–2050); of the weaker, (S − K)/K·100 %, which
 * there is none of where the weaker is zero. null unless both sides are magnitudes.
 */
export function percentageDifference(
  left: number,
  right: number,
  reference: 'stronger' | 'weaker' = 'stronger',
): number | null {
  if (!areMagnitudes(left, right)) return null
  const of = reference === 'stronger' ? Math.max(left, right) : Math.min(left, right)
  return of > 0 ? (100 * (right - left)) / of : null
}
