import type { Crossing } from '../events/flank.ts'
import { velocityAtCrossing } from '../events/jump-events.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import type { EventTimes, TakeoffTime, TrialTimes } from './event-times.ts'
import {
  displacementOf,
  velocityOf,
  type JumpModel,
  type TakeoffModel,
  type TrialModel,
} from './trial-model.ts'
import { miss, put, reasons, type Measured } from './measured.ts'

/** Velocity where the force crosses the event force: of the integral up to the fitted instant, itself early or late. */
export function velocityAtEvent(model: TrialModel, crossing: Crossing, time: Quantity): Quantity {
  const { budget, motion, settings } = model
  const instant = velocityAtCrossing(motion, crossing, settings)
  const acceleration = ((settings.eventForceN - motion.systemWeight) * motion.gravity) / motion.systemWeight
  return budget.pair(instant.velocity, 1, velocityOf(model, instant), acceleration, time)
}

export function takeoffVelocityOf(model: TakeoffModel, times: TakeoffTime): Quantity {
  return velocityAtEvent(model, model.events.takeoff, times.takeoff)
}

/** Height that a velocity upwards reaches, or that a fall comes from: v²/2g. */
export function heightOfVelocity(
  { budget, gravity }: Pick<TrialModel, 'budget' | 'gravity'>,
  velocity: Quantity,
): Quantity {
  const g = gravity.value
  const height = (velocity.value * velocity.value) / (2 * g)
  return budget.pair(height, velocity.value / g, velocity, -height / g, gravity)
}

/** Height that a time in the air tells: g·t²/8. */
export function heightOfFlight({ budget, gravity }: TrialModel, flightTime: Quantity): Quantity {
  const t = flightTime.value
  const g = gravity.value
  return budget.pair((g * t * t) / 8, (g * t) / 4, flightTime, (t * t) / 8, gravity)
}

/** Time in the air and the height that it tells; answers the time. */
export function flightFigures(
  model: TrialModel,
  times: TrialTimes & TakeoffTime,
  into: Measured,
): Quantity | null {
  if (!times.touchdown) {
    miss(into, ['flightTime', 'jumpHeightFlight'], reasons.noTouchdown)
    return null
  }
  const flightTime = model.budget.minus(times.touchdown, times.takeoff)
  put(into, 'flightTime', flightTime)
  put(into, 'jumpHeightFlight', heightOfFlight(model, flightTime))
  return flightTime
}

/** What follows from the takeoff velocity alone; answers the height. */
export function takeoffFigures(model: TrialModel, takeoffVelocity: Quantity, into: Measured): Quantity {
  const height = heightOfVelocity(model, takeoffVelocity)
  put(into, 'jumpHeightImpulse', height)
  put(into, 'takeoffVelocity', takeoffVelocity)
  put(into, 'takeoffMomentum', model.budget.times(model.systemMass, takeoffVelocity))
  return height
}

/** How high and how fast: takeoff velocity by impulse and what follows from it and from the times. */
export function jumpFigures(
  model: JumpModel,
  times: EventTimes,
  takeoffVelocity: Quantity,
  into: Measured,
): void {
  const { budget } = model
  const height = takeoffFigures(model, takeoffVelocity, into)
  const timeToTakeoff = budget.minus(times.takeoff, times.onset)
  put(into, 'timeToTakeoff', timeToTakeoff)
  put(into, 'rsiModified', budget.over(height, timeToTakeoff))
  const flightTime = flightFigures(model, times, into)
  if (flightTime) put(into, 'flightPerTakeoffTime', budget.over(flightTime, timeToTakeoff))
  else miss(into, ['flightPerTakeoffTime'], reasons.noTouchdown)
}

/** How high above quiet stance, where displacement is zero. */
export function heightAboveStanding(
  model: TakeoffModel,
  times: TakeoffTime,
  takeoffVelocity: Quantity,
  into: Measured,
): void {
  const { budget, motion, events, settings } = model
  const atTakeoff = velocityAtCrossing(motion, events.takeoff, settings)
  const { displacement, velocity } = atTakeoff
  const before = budget.pair(displacement, 1, displacementOf(model, atTakeoff), velocity, times.takeoff)
  put(into, 'jumpHeightTotal', budget.plus(heightOfVelocity(model, takeoffVelocity), before))
}
