import { forceAt } from './motion.ts'
import type { RunningSums } from './running-mean.ts'

/**
 * Integral of force from one position in samples to another, N·s: trapezoid rule with partial first and last
 * intervals; negative backwards. `sums` are the running sums of the same force.
 */
export function grossImpulse(
  force: Float64Array,
  running: RunningSums,
  from: number,
  to: number,
  dt: number,
): number {
  if (to < from) return -grossImpulse(force, running, to, from, dt)
  const { sums, reference } = running
  const a = Math.ceil(from)
  const b = Math.floor(to)
  const start = forceAt(force, from)
  const end = forceAt(force, to)
  if (b < a) return ((start + end) / 2) * (to - from) * dt
  const whole = sums[b + 1] - sums[a] + reference * (b + 1 - a) - (force[a] + force[b]) / 2
  const before = ((start + force[a]) / 2) * (a - from)
  const after = ((force[b] + end) / 2) * (to - b)
  return (whole + before + after) * dt
}
