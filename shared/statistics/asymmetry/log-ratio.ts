/**
 * Log ratio 100·ln(R/L): close to the symmetry index for small differences, and log ratios of several trials can be
 * averaged. Above zero where the right side is larger. null unless both sides are above zero.
 */
export function logRatio(left: number, right: number): number | null {
  const smaller = Math.min(left, right)
  // ln(1 + x) keeps the digits of a small difference.
  const ratio = 100 * Math.log1p(Math.abs(right - left) / smaller)
  return smaller > 0 && Number.isFinite(ratio) ? Math.sign(right - left) * ratio : null
}
