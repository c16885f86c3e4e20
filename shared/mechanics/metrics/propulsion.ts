import { velocityAtCrossing } from '../events/jump-events.ts'
import { extremeVelocity, placeWeightCrossing } from '../events/turning-points.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import type { TakeoffTime } from './event-times.ts'
import { at, displacementOf, velocityOf, type TakeoffModel, type TrialModel } from './trial-model.ts'
import { put, type Measured } from './measured.ts'
import { extremePower, putPower } from './power.ts'
import { greatestRate, type FilteredForce } from './rate-of-force.ts'

/** Where the way up begins, from rest: the deepest point, or the onset of a push from a held squat. */
export interface PropulsionStart {
  position: number
  time: Quantity
  displacement: Quantity
}

/** Greatest upward velocity before takeoff, where force falls back to the weight. */
export function peakVelocityOf(model: TrialModel, from: number, takeoff: number): Quantity {
  const { motion, zero, settings } = model
  const fastest = extremeVelocity(motion, from, takeoff, 1)
  return velocityOf(model, at(model, placeWeightCrossing(motion, fastest, zero.total, settings).position))
}

/** Time, work and power of the way up, and the rate of force where the filtered force is given. */
export function propulsionFigures(
  model: TakeoffModel,
  start: PropulsionStart,
  times: TakeoffTime,
  takeoffVelocity: Quantity,
  filtered: FilteredForce | null,
  into: Measured,
): void {
  const { budget, motion, events, settings, systemWeight, systemMass } = model
  const { takeoff } = events
  const time = budget.minus(times.takeoff, start.time)
  const atTakeoff = velocityAtCrossing(motion, takeoff, settings)
  const rise = budget.minus(displacementOf(model, atTakeoff), start.displacement)
  const kinetic = budget.scaled(budget.times(systemMass, budget.times(takeoffVelocity, takeoffVelocity)), 0.5)
  const work = budget.plus(kinetic, budget.times(systemWeight, rise))
  put(into, 'propulsionTime', time)
  if (filtered)
    put(into, 'propulsionRateOfForce', greatestRate(model, filtered, start.position, takeoff.position))
  put(into, 'propulsionWork', work)
  putPower(model, into, 'meanPropulsionPower', budget.over(work, time))
  putPower(model, into, 'peakPower', extremePower(model, start.position, takeoff.position, 1))
}
