import { instantAt, integrate, type Motion } from './motion.ts'

/** An instant at which the velocity is known: at rest, or where a flight tells it. */
export interface Anchor {
  /** Position in samples. */
  position: number
  /** m/s */
  velocity: number
}

/**
 * Integrates net force twice from `first` (a sample) to the end of the record so that the velocity is the anchor's
 * there: backwards before it, forwards after it. Displacement counts from the anchor. The same trapezoid rule as
 * `integrate`, whose constants are the anchor's.
 */
export function integrateAround(
  force: Float64Array,
  first: number,
  anchor: Anchor,
  systemWeight: number,
  gravity: number,
  dt: number,
): Motion {
  const motion = integrate(force, Math.max(0, Math.min(force.length - 1, first)), systemWeight, gravity, dt)
  const there = instantAt(motion, anchor.position)
  const { velocity, displacement } = motion
  const gain = anchor.velocity - there.velocity
  for (let i = motion.first; i < force.length; i++) {
    velocity[i] += gain
    displacement[i] += gain * (i - anchor.position) * dt - there.displacement
  }
  return { ...motion, start: anchor.position }
}
