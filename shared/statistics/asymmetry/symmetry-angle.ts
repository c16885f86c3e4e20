/**
 * Symmetry angle (45° − arctan(L/R))/90°·100 %: no side serves as the reference. Above zero where the right side is
 * larger. Zifchock, Davis, Higginson, Royer 2008, Gait Posture 27:622–627 (formula from memory), who take 180° off an
 * angle above 90°, which sides of unlike sign give. null where both are zero, or either is no number.
 */
export function symmetryAngle(left: number, right: number): number | null {
  if (!Number.isFinite(left) || !Number.isFinite(right) || (left === 0 && right === 0)) return null
  const angle = 45 - (Math.atan(left / right) * 180) / Math.PI
  return ((angle > 90 ? angle - 180 : angle) / 90) * 100
}
