import type { Quantity } from '../uncertainty/budget.ts'
import type { EventTimes } from './event-times.ts'
import { pushImpulses } from './impulse.ts'
import { miss, put, type Measured } from './measured.ts'
import { peakVelocityOf, propulsionFigures } from './propulsion.ts'
import { greatestForce, meanForce, putForce, smoothForceAt } from './push-forces.ts'
import { filteredForce } from './rate-of-force.ts'
import type { JumpModel } from './trial-model.ts'

/** Forces at fixed times after the onset, s. */
const afterOnset = { force50: 0.05, force100: 0.1, force200: 0.2 } as const

function earlyForces(model: JumpModel, onset: Quantity, into: Measured): void {
  const { events, signal } = model
  for (const [key, afterS] of Object.entries(afterOnset) as [keyof typeof afterOnset, number][]) {
    const position = events.onset.position + afterS / signal.dt
    if (position < events.takeoff.position) put(into, key, smoothForceAt(model, position, onset))
    else miss(into, [key], 'The feet left the plates before.')
  }
}

/** Figures of a push from a held squat: from the onset to takeoff all of it is propulsion. */
export function squatFigures(
  model: JumpModel,
  times: EventTimes,
  takeoffVelocity: Quantity,
  into: Measured,
): void {
  const { budget, systemMass, events } = model
  const { position } = events.onset
  const takeoff = events.takeoff.position
  const peak = greatestForce(model, position, takeoff)
  const time = budget.minus(times.takeoff, times.onset)
  pushImpulses(model, takeoffVelocity, into)
  putForce(model, into, 'peakForce', peak)
  putForce(model, into, 'peakPropulsionForce', peak)
  const mean = meanForce(model, budget.times(systemMass, takeoffVelocity), time)
  putForce(model, into, 'meanPropulsionForce', mean)
  put(into, 'peakVelocity', peakVelocityOf(model, position, takeoff))
  const start = { position, time: times.onset, displacement: budget.exact(0) }
  propulsionFigures(model, start, times, takeoffVelocity, filteredForce(model, position, takeoff), into)
  earlyForces(model, times.onset, into)
}
