import type { Crossing } from '../events/flank.ts'
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
export function crossingTime({ budget, signal, plates }: JumpModel, crossing: Crossing): Quantity {
  const perNewton = -signal.dt / crossing.slope
  return budget.linear(crossing.position * signal.dt, [
    [1, budget.input(0, crossing.positionU * signal.dt)],
    ...plates.map(({ offset }) => [perNewton, offset] as const),
  ])
}

/** The onset moves with the noise of its fit and, because its threshold is a part of the weight, with the weighing. */
function onsetTime({ budget, events, signal, weighingError }: JumpModel): Quantity {
  const { position, positionU, level, slope } = events.onset
  return budget.linear(position * signal.dt, [
    [1, budget.input(0, positionU * signal.dt)],
    [(level * signal.dt) / slope, weighingError],
  ])
}

function weightCrossingTime(model: JumpModel): Quantity | null {
  const { budget, events, signal, motion, weighingError } = model
  if (!events.minimumVelocity) return null
  const { position, positionU } = events.minimumVelocity
  const i = Math.max(1, Math.min(signal.length - 2, Math.round(position)))
  const slope = (motion.force[i + 1] - motion.force[i - 1]) / (2 * signal.dt)
  return budget.linear(position * signal.dt, [
    [1, budget.input(0, positionU * signal.dt)],
    [slope > 0 ? 1 / slope : 0, weighingError],
  ])
}

/** Where velocity is zero: an error of the velocity moves it by that over the acceleration. */
function zeroVelocityTime(model: JumpModel, position: number): Quantity {
  const { budget, motion, signal } = model
  const instant = at(model, position)
  const acceleration = ((instant.force - motion.systemWeight) * motion.gravity) / motion.systemWeight
  return budget.linear(position * signal.dt, [[-1 / acceleration, velocityOf(model, instant)]])
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
    zeroVelocity: zeroVelocity && zeroVelocityTime(model, zeroVelocity.position),
    landingPeak:
      landingPeak && budget.input(landingPeak.position * signal.dt, landingPeak.positionU * signal.dt),
    landingZeroVelocity: landingZeroVelocity === null ? null : zeroVelocityTime(model, landingZeroVelocity),
  }
}
