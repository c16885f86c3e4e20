import type { Settings } from '../settings.ts'
import { fitParabola, parabolaCrossing, parabolaNoiseAt } from '../signal/local-parabola.ts'
import type { Motion } from '../signal/motion.ts'
import type { Noise } from '../signal/noise.ts'

/** Where force passes the weight, with the standard uncertainty of the force there from noise, N. */
export interface Placed {
  position: number
  forceU: number
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
  let greatest = sign * velocity[best]
  for (let i = best + 1; i <= to; i++) {
    const value = sign * velocity[i]
    if (value > greatest) {
      greatest = value
      best = i
    }
  }
  return best
}

/** Place where force passes the weight around a sample of extreme velocity, by a parabola fitted to the force there. */
export function placeWeightCrossing(
  motion: Motion,
  sample: number,
  noise: Noise,
  settings: Settings,
): Placed {
  const { force, dt, systemWeight } = motion
  const shortest = Math.max(2, Math.round(settings.crossingShortestS / dt))
  const slope = Math.abs(fitParabola(force, sample, shortest).slope)
  const half = Math.max(
    shortest,
    Math.min((settings.crossingRiseSd * noise.sd) / slope || 0, settings.crossingLongestS / dt),
  )
  const fit = fitParabola(force, sample, half)
  const position = parabolaCrossing(fit, systemWeight, sample, 2 * half) ?? sample
  return { position, forceU: parabolaNoiseAt(fit, position, noise) }
}

/**
 * Where velocity comes to zero after touchdown: where it rises through zero, or, where an error of the integral keeps
 * it below, where it comes nearest. `null` if it stays beyond `tolerance` (m/s).
 */
export function fallStops(motion: Motion, touchdown: number, last: number, tolerance: number): number | null {
  const crossing = risesThroughZero(motion, touchdown, last)
  if (crossing !== null) return crossing
  const nearest = extremeVelocity(motion, touchdown, last, 1)
  return Math.abs(motion.velocity[nearest]) <= tolerance ? nearest : null
}

/**
 * How far around a position (samples) a curve stays within ±`band` of zero, `curve` being its distance from where it
 * is sought: what an error of that size in the curve can move the position by. The longer of the two sides, for a
 * curve that bends; at most `longest`.
 */
export function staysWithin(
  curve: (sample: number) => number,
  position: number,
  band: number,
  longest: number,
): number {
  const centre = Math.round(position)
  const side = (step: 1 | -1) => {
    let k = 1
    while (k < longest && Math.abs(curve(centre + step * k)) <= band) k++
    const outside = Math.abs(curve(centre + step * k))
    const inside = Math.abs(curve(centre + step * (k - 1)))
    return outside > band && inside < band ? k - 1 + (band - inside) / (outside - inside) : k
  }
  return Math.max(side(1), side(-1))
}
