import { standardGravity } from '../../shared/units/gravity.ts'
import type { ForceChannel, Recording } from '../../shared/mechanics/types.ts'

/**
 * A countermovement jump in closed form, from rest to rest: net impulse and displacement over the whole are zero.
 * Quiet stance, a sin² dip, a sin² push, a raised-cosine unloading to takeoff, free flight, a landing that stops the
 * fall, and two opposite sin² pulses back to standing. Every integral is elementary; symbols as in the comments.
 */
const g = standardGravity
export const mass = 80
export const weight = mass * g
const quietS = 1
const a1 = 5.5
const T1 = 0.45
const T2 = 0.36
const T3 = 0.04
const T4 = 0.2
const T5 = 0.4
/** Velocity where the force reaches zero, m/s. */
const vZero = 2.5
const a2 = (2 * (vZero + (a1 * T1) / 2 + (g * T3) / 2)) / T2
const flightS = (2 * vZero) / g
const p = g + (2 * vZero) / T4

const sin2 = (u: number, T: number) => Math.sin((Math.PI * u) / T) ** 2
/** ∫ sin²(πu/T) du and its integral. */
const sin2V = (u: number, T: number) => u / 2 - (T / (4 * Math.PI)) * Math.sin((2 * Math.PI * u) / T)
const sin2S = (u: number, T: number) =>
  (u * u) / 4 - ((T * T) / (8 * Math.PI * Math.PI)) * (1 - Math.cos((2 * Math.PI * u) / T))
/** ∫ (1 − cos(πu/T))/2 du and its integral: a half raised cosine from 0 to 1. */
const rise = (u: number, T: number) => (1 - Math.cos((Math.PI * u) / T)) / 2
const riseV = (u: number, T: number) => u / 2 - (T / (2 * Math.PI)) * Math.sin((Math.PI * u) / T)
const riseS = (u: number, T: number) =>
  (u * u) / 4 - ((T * T) / (2 * Math.PI * Math.PI)) * (1 - Math.cos((Math.PI * u) / T))

interface Piece {
  duration: number
  a: (u: number) => number
  v: (u: number) => number
  s: (u: number) => number
}

const bottom = -g * ((T4 * T4) / 2) + g * riseS(T4, T4) + p * sin2S(T4, T4) - vZero * T4
const sTakeoff = (() => {
  const s1 = -a1 * sin2S(T1, T1)
  const v1 = -a1 * sin2V(T1, T1)
  const s2 = s1 + v1 * T2 + a2 * sin2S(T2, T2)
  const v2 = v1 + a2 * sin2V(T2, T2)
  return s2 + v2 * T3 - g * riseS(T3, T3)
})()
const a5 = -(2 * (sTakeoff + bottom)) / (T5 * T5)

/** Accelerations with their integrals from rest at the piece's start. */
const pieces: Piece[] = [
  { duration: quietS, a: () => 0, v: () => 0, s: () => 0 },
  { duration: T1, a: (u) => -a1 * sin2(u, T1), v: (u) => -a1 * sin2V(u, T1), s: (u) => -a1 * sin2S(u, T1) },
  { duration: T2, a: (u) => a2 * sin2(u, T2), v: (u) => a2 * sin2V(u, T2), s: (u) => a2 * sin2S(u, T2) },
  { duration: T3, a: (u) => -g * rise(u, T3), v: (u) => -g * riseV(u, T3), s: (u) => -g * riseS(u, T3) },
  { duration: flightS, a: () => -g, v: (u) => -g * u, s: (u) => (-g * u * u) / 2 },
  {
    duration: T4,
    a: (u) => -g + g * rise(u, T4) + p * sin2(u, T4),
    v: (u) => -g * u + g * riseV(u, T4) + p * sin2V(u, T4),
    s: (u) => (-g * u * u) / 2 + g * riseS(u, T4) + p * sin2S(u, T4),
  },
  { duration: T5, a: (u) => a5 * sin2(u, T5), v: (u) => a5 * sin2V(u, T5), s: (u) => a5 * sin2S(u, T5) },
  { duration: T5, a: (u) => -a5 * sin2(u, T5), v: (u) => -a5 * sin2V(u, T5), s: (u) => -a5 * sin2S(u, T5) },
  { duration: Infinity, a: () => 0, v: () => 0, s: () => 0 },
]

/** Start, velocity and displacement at the beginning of each piece. */
const starts = pieces.reduce<{ t: number; v: number; s: number }[]>(
  (all, piece, i) => {
    const { t, v, s } = all[i]
    const d = piece.duration
    return Number.isFinite(d) ? [...all, { t: t + d, v: v + piece.v(d), s: s + v * d + piece.s(d) }] : all
  },
  [{ t: 0, v: 0, s: 0 }],
)

/** The motion at any time, exactly. */
export function motionAt(t: number): { force: number; velocity: number; displacement: number } {
  let i = starts.length - 1
  while (i > 0 && t < starts[i].t) i--
  const { t: t0, v, s } = starts[i]
  const u = t - t0
  return {
    force: mass * (g + pieces[i].a(u)),
    velocity: v + pieces[i].v(u),
    displacement: s + v * u + pieces[i].s(u),
  }
}

export const forceAt = (t: number): number => motionAt(t).force

/** Knots: start of the movement, minimum velocity, end of the push, zero force, contact, landed, standing. */
export const knots = starts.slice(1).map(({ t }) => t)

/** Root of f between a and b, by bisection. */
export function root(f: (t: number) => number, a: number, b: number): number {
  const sign = Math.sign(f(a))
  for (let k = 0; k < 80; k++) {
    const middle = (a + b) / 2
    if (Math.sign(f(middle)) === sign) a = middle
    else b = middle
  }
  return (a + b) / 2
}

/** Time of the greatest f between a and b where it has one maximum, by golden section. */
export function argmax(f: (t: number) => number, a: number, b: number): number {
  const golden = (Math.sqrt(5) - 1) / 2
  for (let k = 0; k < 90; k++) {
    const left = b - golden * (b - a)
    const right = a + golden * (b - a)
    if (f(left) > f(right)) b = right
    else a = left
  }
  return (a + b) / 2
}

/** Event instants of the continuous curve by the engine's definitions. */
export function trueEvents() {
  const [start, vMin, pushEnd, zeroForce, contact, landed] = knots
  return {
    onset: root((t) => forceAt(t) - 0.975 * weight, start, start + T1 / 2) - 0.03,
    minimumForce: start + T1 / 2,
    minimumVelocity: vMin,
    zeroVelocity: root((t) => motionAt(t).velocity, vMin, pushEnd),
    takeoff: root((t) => forceAt(t) - 10, pushEnd, zeroForce),
    touchdown: root((t) => forceAt(t) - 10, contact, contact + T4 / 4),
    landingPeak: argmax(forceAt, contact, landed),
    landingZeroVelocity: landed,
  }
}

export type Sampling = {
  sampleRateHz?: number
  durationS?: number
  /** Time of the first sample on the curve's clock. */
  startS?: number
  shareLeft?: number
  channels?: 'feet' | 'single' | 'total'
  disturb?: (force: number, t: number, channel: ForceChannel) => number
}

/** The jump as plates would sample it. */
export function sampled(options: Sampling = {}): Recording {
  const { sampleRateHz = 1000, durationS = 5.2, startS = 0, shareLeft = 0.5, channels = 'single' } = options
  const n = Math.round(durationS * sampleRateHz)
  const disturb = options.disturb ?? ((force: number) => force)
  const make = (channel: ForceChannel, share: number) =>
    Float64Array.from({ length: n }, (_, i) => {
      const t = startS + i / sampleRateHz
      return disturb(share * forceAt(t), t, channel)
    })
  return {
    sampleRateHz,
    channels:
      channels === 'feet'
        ? { left: make('left', shareLeft), right: make('right', 1 - shareLeft) }
        : { [channels]: make(channels, 1) },
    filledSamples: 0,
    timeBaseError: 0,
    notes: [],
  }
}
