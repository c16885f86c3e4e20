import { velocityAtCrossing } from '../events/jump-events.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import type { EventTimes } from './event-times.ts'
import { displacementOf, velocityOf, type JumpModel } from './jump-model.ts'
import { miss, put, reasons, type Measured } from './measured.ts'

/** Velocity at takeoff: of the integral up to the fitted instant, which may be early or late itself. */
export function takeoffVelocityOf(model: JumpModel, times: EventTimes): Quantity {
  const { budget, motion, events, settings } = model
  const instant = velocityAtCrossing(motion, events.takeoff, settings)
  const acceleration = ((settings.eventForceN - motion.systemWeight) * motion.gravity) / motion.systemWeight
  return budget.pair(instant.velocity, 1, velocityOf(model, instant), acceleration, times.takeoff)
}

function riseFrom({ budget, gravity }: JumpModel, velocity: Quantity): Quantity {
  const g = gravity.value
  const height = (velocity.value * velocity.value) / (2 * g)
  return budget.pair(height, velocity.value / g, velocity, -height / g, gravity)
}

function flightFigures(model: JumpModel, times: EventTimes, timeToTakeoff: Quantity, into: Measured): void {
  if (!times.touchdown)
    return miss(into, ['flightTime', 'jumpHeightFlight', 'flightPerTakeoffTime'], reasons.noTouchdown)
  const { budget, gravity } = model
  const flightTime = budget.minus(times.touchdown, times.takeoff)
  const t = flightTime.value
  const g = gravity.value
  put(into, 'flightTime', flightTime)
  const height = budget.pair((g * t * t) / 8, (g * t) / 4, flightTime, (t * t) / 8, gravity)
  put(into, 'jumpHeightFlight', height)
  put(into, 'flightPerTakeoffTime', budget.over(flightTime, timeToTakeoff))
}

/** How high and how fast: takeoff velocity by impulse and what follows from it and from the times. */
export function jumpFigures(
  model: JumpModel,
  times: EventTimes,
  takeoffVelocity: Quantity,
  into: Measured,
): void {
  const { budget, motion, events, settings } = model
  const height = riseFrom(model, takeoffVelocity)
  const timeToTakeoff = budget.minus(times.takeoff, times.onset)
  const atTakeoff = velocityAtCrossing(motion, events.takeoff, settings)
  const before = budget.pair(
    atTakeoff.displacement,
    1,
    displacementOf(model, atTakeoff),
    atTakeoff.velocity,
    times.takeoff,
  )
  put(into, 'jumpHeightImpulse', height)
  put(into, 'jumpHeightTotal', budget.plus(height, before))
  put(into, 'takeoffVelocity', takeoffVelocity)
  put(into, 'takeoffMomentum', budget.times(model.systemMass, takeoffVelocity))
  put(into, 'timeToTakeoff', timeToTakeoff)
  put(into, 'rsiModified', budget.over(height, timeToTakeoff))
  flightFigures(model, times, timeToTakeoff, into)
}
