import { velocityAtCrossing } from '../events/jump-events.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import type { EventTimes } from './event-times.ts'
import { displacementOf, velocityOf, type JumpModel } from './jump-model.ts'
import { measured, missing, reasons, type Measured } from './measured.ts'

/** Velocity at takeoff: of the integral up to the fitted instant, which may be early or late itself. */
export function takeoffVelocityOf(model: JumpModel, times: EventTimes): Quantity {
  const { budget, motion, events, settings } = model
  const instant = velocityAtCrossing(motion, events.takeoff, settings)
  const acceleration = ((settings.eventForceN - motion.systemWeight) * motion.gravity) / motion.systemWeight
  return budget.linear(instant.velocity, [
    [1, velocityOf(model, instant)],
    [acceleration, times.takeoff],
  ])
}

function riseFrom({ budget, gravity }: JumpModel, velocity: Quantity): Quantity {
  const g = gravity.value
  const height = (velocity.value * velocity.value) / (2 * g)
  return budget.linear(height, [
    [velocity.value / g, velocity],
    [-height / g, gravity],
  ])
}

/** How high and how fast: takeoff velocity by impulse and what follows from it and from the times. */
export function jumpFigures(model: JumpModel, times: EventTimes, takeoffVelocity: Quantity): Measured {
  const { budget, motion, events, settings, gravity, systemMass } = model
  const height = riseFrom(model, takeoffVelocity)
  const timeToTakeoff = budget.minus(times.takeoff, times.onset)
  const atTakeoff = velocityAtCrossing(motion, events.takeoff, settings)
  const before = budget.linear(atTakeoff.displacement, [
    [1, displacementOf(model, atTakeoff)],
    [atTakeoff.velocity, times.takeoff],
  ])
  const jump = measured({
    jumpHeightImpulse: height,
    jumpHeightTotal: budget.plus(height, before),
    takeoffVelocity,
    takeoffMomentum: budget.times(systemMass, takeoffVelocity),
    timeToTakeoff,
    rsiModified: budget.over(height, timeToTakeoff),
  })
  if (!times.touchdown)
    return {
      ...jump,
      ...missing(['flightTime', 'jumpHeightFlight', 'flightPerTakeoffTime'], reasons.noTouchdown),
    }
  const flightTime = budget.minus(times.touchdown, times.takeoff)
  const t = flightTime.value
  const g = gravity.value
  const flight = measured({
    flightTime,
    jumpHeightFlight: budget.linear((g * t * t) / 8, [
      [(g * t) / 4, flightTime],
      [(t * t) / 8, gravity],
    ]),
    flightPerTakeoffTime: budget.over(flightTime, timeToTakeoff),
  })
  return { ...jump, ...flight }
}
