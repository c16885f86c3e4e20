import { fitParabola, parabolaCrossing, parabolaNoiseAt, parabolaSlopeAt } from '../signal/local-parabola.ts'
import type { Motion } from '../signal/motion.ts'
import type { Noise } from '../signal/noise.ts'

/** An instant placed between samples, with its standard uncertainty from noise in samples. */
export interface Placed {
  position: number
  positionU: number
}

/** Where velocity rises through zero in [from, to]; samples, by the acceleration between two of them. `null` if never. */
export function risesThroughZero(motion: Motion, from: number, to: number): number | null {
  const { velocity } = motion
  for (let i = Math.max(motion.first + 1, Math.ceil(from)); i <= to; i++) {
    if (!(velocity[i - 1] < 0 && velocity[i] >= 0)) continue
    return i - 1 + rootWithin(motion, i - 1)
  }
  return null
}

/** Part of the interval after sample i at which velocity is zero, with force straight between the two samples. */
function rootWithin({ velocity, force, systemWeight, gravity, dt }: Motion, i: number): number {
  const perMass = (gravity / systemWeight) * dt
  const a = (force[i] - systemWeight) * perMass
  const b = (force[i + 1] - systemWeight) * perMass
  const bend = (b - a) / 2
  const root = a * a - 4 * bend * velocity[i]
  const share = (-2 * velocity[i]) / (a + Math.sqrt(Math.max(0, root)))
  return share >= 0 && share <= 1 ? share : velocity[i] / (velocity[i] - velocity[i + 1])
}

/** Sample of the least (sign −1) or greatest (sign 1) velocity in [from, to]. */
export function extremeVelocity({ velocity, first }: Motion, from: number, to: number, sign: 1 | -1): number {
  let best = Math.max(first, Math.ceil(from))
  for (let i = best; i <= to; i++) if (sign * velocity[i] > sign * velocity[best]) best = i
  return best
}

/** Places where force passes the weight around a sample of extreme velocity. */
export function placeWeightCrossing(motion: Motion, sample: number, noise: Noise): Placed {
  const half = Math.max(2, Math.round(0.006 / motion.dt))
  const fit = fitParabola(motion.force, sample, half)
  const position = parabolaCrossing(fit, motion.systemWeight, sample, 2 * half) ?? sample
  const slope = Math.abs(parabolaSlopeAt(fit, position))
  const positionU = Math.min(4 * half, parabolaNoiseAt(fit, position, noise) / slope)
  return { position, positionU: Number.isFinite(positionU) ? positionU : 4 * half }
}
