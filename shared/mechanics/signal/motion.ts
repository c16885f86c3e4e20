import { borrow } from './workspace.ts'

/** Velocity and displacement of the centre of mass from rest at an instant between samples. */
export interface Motion {
  /** Start of the integration, samples. */
  start: number
  /** First sample at or after the start. */
  first: number
  dt: number
  gravity: number
  systemWeight: number
  force: Float64Array
  /** m/s at each sample from `first`, by the trapezoid rule. */
  velocity: Float64Array
  /** m above the start at each sample from `first`. */
  displacement: Float64Array
}

/** What the motion is at an instant. */
export interface Instant {
  /** Position in samples. */
  position: number
  force: number
  velocity: number
  displacement: number
}

/** Force between samples by a straight line. */
export function forceAt(force: Float64Array, position: number): number {
  const i = Math.max(0, Math.min(force.length - 2, Math.floor(position)))
  const share = position - i
  return force[i] + share * (force[i + 1] - force[i])
}

/**
 * Integrates net force twice from rest at `start` (samples, may lie between two), with a partial first interval.
 * Force is taken as straight between samples: the trapezoid rule for velocity, exact for the displacement.
 */
export function integrate(
  force: Float64Array,
  start: number,
  systemWeight: number,
  gravity: number,
  dt: number,
): Motion {
  const velocity = borrow('velocity', force.length)
  const displacement = borrow('displacement', force.length)
  const first = Math.min(force.length - 1, Math.max(0, Math.ceil(start)))
  const perMass = gravity / systemWeight
  let before = (forceAt(force, start) - systemWeight) * perMass
  let a = (force[first] - systemWeight) * perMass
  const partial = (first - start) * dt
  let v = ((before + a) / 2) * partial
  let s = ((2 * before + a) / 6) * partial * partial
  velocity[first] = v
  displacement[first] = s
  for (let i = first + 1; i < force.length; i++) {
    before = a
    a = (force[i] - systemWeight) * perMass
    s += v * dt + ((2 * before + a) / 6) * dt * dt
    v += ((before + a) / 2) * dt
    velocity[i] = v
    displacement[i] = s
  }
  return { start, first, dt, gravity, systemWeight, force, velocity, displacement }
}

/** The motion at an instant between samples. `known` is the force there where an event fixes it. */
export function instantAt(motion: Motion, position: number, known?: number): Instant {
  const { force, velocity, displacement, dt, first, systemWeight } = motion
  const i = Math.max(first, Math.min(force.length - 1, Math.floor(position)))
  const rest = (position - i) * dt
  const perMass = motion.gravity / systemWeight
  const here = known ?? forceAt(force, position)
  const a = (force[i] - systemWeight) * perMass
  const b = (here - systemWeight) * perMass
  return {
    position,
    force: here,
    velocity: velocity[i] + ((a + b) / 2) * rest,
    displacement: displacement[i] + velocity[i] * rest + ((2 * a + b) / 6) * rest * rest,
  }
}
