/** Whether both sides are magnitudes that a share can be taken of: finite, not negative, and not both zero. */
export function areMagnitudes(left: number, right: number): boolean {
  return left >= 0 && right >= 0 && left + right > 0 && left + right < Infinity
}
