import type { Crossing } from '../events/flank.ts'
import { staysWithin } from '../events/turning-points.ts'
import type { Settings } from '../settings.ts'
import { meanAround } from '../signal/running-mean.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import { at, velocityOf, type JumpModel, type TrialModel } from './trial-model.ts'

/** Instants of the events with their uncertainties, in seconds from the recording's first sample. */
export interface TrialTimes {
  touchdown: Quantity | null
  minimumVelocity: Quantity | null
  zeroVelocity: Quantity | null
  landingPeak: Quantity | null
  landingZeroVelocity: Quantity | null
}

/** Where the feet leave the plates. */
export interface TakeoffTime {
  takeoff: Quantity
}

/** Of a jump from stance. */
export interface EventTimes extends TrialTimes, TakeoffTime {
  onset: Quantity
}

/**
 * What a touch adds to the force without showing in the fit: ringing that the rise swallows, a recorder's low-pass,
 * a heel or toe that comes a moment later. It moves a gentle crossing further than a steep one; samples.
 */
function unseenU(slope: number, dt: number, settings: Settings): number {
  const byForce = Math.min(settings.touchLongestU / dt, settings.touchForceU / slope)
  return Math.hypot(settings.touchTimeU / dt, byForce)
}

/**
 * A crossing of the event force moves with the noise of its fit, with what a touch sets off, and with the zero of the
 * plates. Touches of the same kind share one error `alike` of size 1; one of its own where not given.
 */
export function crossingTime(
  { budget, signal, settings, plates, zero }: TrialModel,
  { position, positionU, ringingU, slope }: Crossing,
  alike?: Quantity,
): Quantity {
  const { dt } = signal
  const seenU = ringingU ?? 0
  const noiseU = Math.sqrt(Math.max(0, positionU * positionU - seenU * seenU))
  const isTouch = slope > 0 && ringingU !== undefined
  const touchU = isTouch ? Math.max(seenU, unseenU(slope, dt, settings)) : seenU
  const touch = touchU > 0 ? [[touchU * dt, alike ?? budget.input(0, 1)] as const] : []
  return budget.linear(position * dt, [
    [1, budget.input(0, noiseU * dt, zero.noiseDof)],
    ...touch,
    ...plates.map(({ offset }) => [-dt / slope, offset] as const),
  ])
}

/** The onset moves with the noise of its fit and, because its threshold is a part of the weight, with the weighing. */
function onsetTime({ budget, events, signal, weighingError, zero }: JumpModel): Quantity {
  const { position, positionU, level, slope } = events.onset
  return budget.linear(position * signal.dt, [
    [1, budget.input(0, positionU * signal.dt, zero.noiseDof)],
    [(level * signal.dt) / slope, weighingError],
  ])
}

/** Longest time that an ill-defined instant is taken to be unsure by, s. */
const unsureS = 0.5
/** Half the running mean over which force is compared with the weight, s. */
const smoothedS = 0.006

/** Where force passes the weight: an error of force or weight moves it as far as the force stays within that error. */
function weightCrossingTime(model: TrialModel): Quantity | null {
  const { budget, events, signal, motion, weighingError } = model
  if (!events.minimumVelocity) return null
  const { position, forceU } = events.minimumVelocity
  const error = budget.pair(0, 1, budget.input(0, forceU), 1, weighingError)
  const u = budget.combined(error).u
  if (!(u > 0)) return budget.exact(position * signal.dt)
  const half = Math.max(1, Math.round(smoothedS / signal.dt))
  const distance = (i: number) => meanAround(model.sums, i, half) - motion.systemWeight
  const stays = staysWithin(distance, position, u, unsureS / signal.dt) * signal.dt
  return budget.linear(position * signal.dt, [[stays / u, error]])
}

/** Where velocity is zero: an error of the velocity moves it as far as the velocity stays within that error. */
function zeroVelocityTime(model: TrialModel, position: number): Quantity {
  const { budget, motion, signal } = model
  if (!budget.on) return budget.exact(position * signal.dt)
  const velocity = velocityOf(model, at(model, position))
  const u = budget.combined(velocity).u
  const { velocity: v } = at(model, position)
  const distance = (i: number) => (motion.velocity[i] ?? Infinity) - v
  const stays = staysWithin(distance, position, u, unsureS / signal.dt) * signal.dt
  return budget.linear(position * signal.dt, [[u > 0 ? -stays / u : 0, velocity]])
}

/** Times of what any trial may have: its landing, and the turning points of its movement. */
export function trialTimes(model: TrialModel): TrialTimes {
  const { budget, events, signal } = model
  const { touchdown, zeroVelocity, landingPeak, landingZeroVelocity } = events
  return {
    touchdown: touchdown && crossingTime(model, touchdown),
    minimumVelocity: weightCrossingTime(model),
    zeroVelocity: zeroVelocity === null ? null : zeroVelocityTime(model, zeroVelocity),
    landingPeak:
      landingPeak && budget.input(landingPeak.position * signal.dt, landingPeak.positionU * signal.dt),
    landingZeroVelocity: landingZeroVelocity === null ? null : zeroVelocityTime(model, landingZeroVelocity),
  }
}

/** Times of the events of a jump from stance. */
export function eventTimes(model: JumpModel): EventTimes {
  return {
    onset: onsetTime(model),
    takeoff: crossingTime(model, model.events.takeoff),
    ...trialTimes(model),
  }
}
