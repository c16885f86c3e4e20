import type { Crossing } from '../events/flank.ts'
import { staysWithin } from '../events/turning-points.ts'
import { meanAround } from '../signal/running-mean.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import { at, velocityOf, type JumpModel } from './jump-model.ts'

/** Instants of the events with their uncertainties, in seconds from the recording's first sample. */
export interface EventTimes {
  onset: Quantity
  takeoff: Quantity
  touchdown: Quantity | null
  minimumVelocity: Quantity | null
  zeroVelocity: Quantity | null
  landingPeak: Quantity | null
  landingZeroVelocity: Quantity | null
}

/** A crossing of the event force moves with the noise of its fit and with the zero of the plates. */
function crossingTime({ budget, signal, plates, zero }: JumpModel, crossing: Crossing): Quantity {
  const perNewton = -signal.dt / crossing.slope
  return budget.linear(crossing.position * signal.dt, [
    [1, budget.input(0, crossing.positionU * signal.dt, zero.noiseDof)],
    ...plates.map(({ offset }) => [perNewton, offset] as const),
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
function weightCrossingTime(model: JumpModel): Quantity | null {
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
function zeroVelocityTime(model: JumpModel, position: number): Quantity {
  const { budget, motion, signal } = model
  if (!budget.on) return budget.exact(position * signal.dt)
  const velocity = velocityOf(model, at(model, position))
  const u = budget.combined(velocity).u
  const { velocity: v } = at(model, position)
  const distance = (i: number) => (motion.velocity[i] ?? Infinity) - v
  const stays = staysWithin(distance, position, u, unsureS / signal.dt) * signal.dt
  return budget.linear(position * signal.dt, [[u > 0 ? -stays / u : 0, velocity]])
}

/** Times of a trial's events. */
export function eventTimes(model: JumpModel): EventTimes {
  const { budget, events, signal } = model
  const { touchdown, zeroVelocity, landingPeak, landingZeroVelocity } = events
  return {
    onset: onsetTime(model),
    takeoff: crossingTime(model, events.takeoff),
    touchdown: touchdown && crossingTime(model, touchdown),
    minimumVelocity: weightCrossingTime(model),
    zeroVelocity: zeroVelocity === null ? null : zeroVelocityTime(model, zeroVelocity),
    landingPeak:
      landingPeak && budget.input(landingPeak.position * signal.dt, landingPeak.positionU * signal.dt),
    landingZeroVelocity: landingZeroVelocity === null ? null : zeroVelocityTime(model, landingZeroVelocity),
  }
}
