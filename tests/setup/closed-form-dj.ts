import { standardGravity } from '../../shared/units/gravity.ts'
import type { ForceChannel, Recording } from '../../shared/mechanics/types.ts'
import { root } from './closed-form-cmj.ts'

/**
 * A drop jump in closed form, from the first touch to rest: empty plates, a half-sine contact that takes up a fall of
 * 0.30 m and leaves at 2.45 m/s, free flight, a landing that stops the fall, and two opposite sin² pulses to standing.
 */
const g = standardGravity
export const mass = 70
export const weight = mass * g
export const dropHeightM = 0.3
/** Speed of the fall at the first touch, and velocity where the force comes back to zero, m/s. */
export const fallSpeed = Math.sqrt(2 * g * dropHeightM)
export const leaves = 2.45
export const contactS = 0.2
/** Greatest force of the contact: the half-sine that turns the one velocity into the other. */
export const greatestForce = (Math.PI / (2 * contactS)) * (mass * (fallSpeed + leaves) + weight * contactS)
const emptyS = 1
const landingS = 0.2
const risingS = 0.4
/** Height above standing at the first touch: on the toes. */
const touchM = 0.05
const flightS = (2 * leaves) / g
const p = g + (2 * leaves) / landingS

const firstTouch = emptyS
export const zeroForce = firstTouch + contactS
const secondTouch = zeroForce + flightS
const landed = secondTouch + landingS
const standing = landed + 2 * risingS

const sin2 = (u: number, T: number) => Math.sin((Math.PI * u) / T) ** 2
const sin2V = (u: number, T: number) => u / 2 - (T / (4 * Math.PI)) * Math.sin((2 * Math.PI * u) / T)
const sin2S = (u: number, T: number) =>
  (u * u) / 4 - ((T * T) / (8 * Math.PI * Math.PI)) * (1 - Math.cos((2 * Math.PI * u) / T))
const rise = (u: number, T: number) => (1 - Math.cos((Math.PI * u) / T)) / 2
const riseV = (u: number, T: number) => u / 2 - (T / (2 * Math.PI)) * Math.sin((Math.PI * u) / T)
const riseS = (u: number, T: number) =>
  (u * u) / 4 - ((T * T) / (2 * Math.PI * Math.PI)) * (1 - Math.cos((Math.PI * u) / T))

const omega = Math.PI / contactS
const contactV = (u: number) =>
  -fallSpeed + (greatestForce / (mass * omega)) * (1 - Math.cos(omega * u)) - g * u
const contactWay = (u: number) =>
  -fallSpeed * u + (greatestForce / (mass * omega)) * (u - Math.sin(omega * u) / omega) - (g * u * u) / 2
const leavesAtM = touchM + contactWay(contactS)
const landingWay = (u: number) =>
  -leaves * u - (g * u * u) / 2 + g * riseS(u, landingS) + p * sin2S(u, landingS)
const lowestM = leavesAtM + landingWay(landingS)
const a5 = (-2 * lowestM) / (risingS * risingS)

/** The motion from the first touch on, exactly; before it the athlete is not on the plates. */
export function motionAt(t: number): { force: number; velocity: number; displacement: number } {
  const of = (a: number, velocity: number, displacement: number) => ({
    force: mass * (g + a),
    velocity,
    displacement,
  })
  if (t < firstTouch) return { force: 0, velocity: NaN, displacement: NaN }
  if (t < zeroForce) {
    const u = t - firstTouch
    return {
      force: greatestForce * Math.sin(omega * u),
      velocity: contactV(u),
      displacement: touchM + contactWay(u),
    }
  }
  if (t < secondTouch) {
    const u = t - zeroForce
    return { force: 0, velocity: leaves - g * u, displacement: leavesAtM + leaves * u - (g * u * u) / 2 }
  }
  if (t < landed) {
    const u = t - secondTouch
    return of(
      -g + g * rise(u, landingS) + p * sin2(u, landingS),
      -leaves - g * u + g * riseV(u, landingS) + p * sin2V(u, landingS),
      leavesAtM + landingWay(u),
    )
  }
  const u = t - landed
  if (u < risingS) return of(a5 * sin2(u, risingS), a5 * sin2V(u, risingS), lowestM + a5 * sin2S(u, risingS))
  const w = u - risingS
  if (w < risingS) {
    const [v, s] = [a5 * sin2V(risingS, risingS), lowestM + a5 * sin2S(risingS, risingS)]
    return of(-a5 * sin2(w, risingS), v - a5 * sin2V(w, risingS), s + v * w - a5 * sin2S(w, risingS))
  }
  return of(0, 0, 0)
}

const forceAt = (t: number): number => motionAt(t).force

/** Event instants of the continuous curve by the engine's definitions. */
export function trueEvents() {
  return {
    arrival: root((t) => forceAt(t) - 10, firstTouch, firstTouch + contactS / 4),
    zeroVelocity: root((t) => motionAt(t).velocity, firstTouch, firstTouch + contactS * 0.75),
    takeoff: root((t) => forceAt(t) - 10, zeroForce - contactS / 4, zeroForce - 1e-12),
    touchdown: root((t) => forceAt(t) - 10, secondTouch, secondTouch + landingS / 4),
    landingZeroVelocity: landed,
    standing,
  }
}

export type Sampling = {
  sampleRateHz?: number
  /** Quiet stance after the landing, s. */
  quietS?: number
  shareLeft?: number
  channels?: 'feet' | 'total'
  disturb?: (force: number, t: number, channel: ForceChannel) => number
}

/** The drop jump as plates would sample it; the clock's zero is the first sample. */
export function sampled(options: Sampling = {}): Recording {
  const { sampleRateHz = 1000, quietS = 1.6, shareLeft = 0.5, channels = 'total' } = options
  const n = Math.round((standing + quietS) * sampleRateHz)
  const disturb = options.disturb ?? ((force: number) => force)
  const make = (channel: ForceChannel, share: number) =>
    Float64Array.from({ length: n }, (_, i) => {
      const t = i / sampleRateHz
      return disturb(share * forceAt(t), t, channel)
    })
  return {
    sampleRateHz,
    channels:
      channels === 'feet'
        ? { left: make('left', shareLeft), right: make('right', 1 - shareLeft) }
        : { total: make('total', 1) },
    filledSamples: 0,
    timeBaseError: 0,
    notes: [],
  }
}
