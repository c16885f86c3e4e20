import type { MetricKey } from '../catalogue.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import type { EventTimes } from './event-times.ts'
import { downwardVelocityOf } from './impulse.ts'
import { at, displacementOf, forceOf, type JumpModel } from './trial-model.ts'
import { miss, put, reasons, type Measured } from './measured.ts'
import { extremePower, putPower } from './power.ts'
import { peakVelocityOf, propulsionFigures } from './propulsion.ts'
import { filteredForce, meanRate } from './rate-of-force.ts'

/** What needs a countermovement. */
const dipKeys: MetricKey[] = [
  'brakingRateOfForce',
  'propulsionRateOfForce',
  'unweightingTime',
  'brakingTime',
  'propulsionTime',
  'peakDownwardVelocity',
  'countermovementDepth',
  'legStiffness',
  'peakPower',
  'peakPowerPerKg',
  'meanPropulsionPower',
  'meanPropulsionPowerPerKg',
  'peakBrakingPower',
  'peakBrakingPowerPerKg',
  'propulsionWork',
]

/** Times, velocities, depth, stiffness, power and work of a push with a countermovement. */
export function pushFigures(
  model: JumpModel,
  times: EventTimes,
  takeoffVelocity: Quantity,
  into: Measured,
): void {
  const { budget, events, systemWeight } = model
  const { onset, minimumVelocity, zeroVelocity, takeoff } = events
  put(into, 'peakVelocity', peakVelocityOf(model, zeroVelocity ?? onset.position, takeoff.position))
  const downward = downwardVelocityOf(model)
  if (!minimumVelocity || zeroVelocity === null || !downward || !times.minimumVelocity || !times.zeroVelocity)
    return miss(into, dipKeys, reasons.noDip)

  const brakingTime = budget.minus(times.zeroVelocity, times.minimumVelocity)
  put(into, 'unweightingTime', budget.minus(times.minimumVelocity, times.onset))
  put(into, 'brakingTime', brakingTime)
  put(into, 'peakDownwardVelocity', downward)

  const deepest = at(model, zeroVelocity)
  const depth = displacementOf(model, deepest)
  const way = budget.minus(displacementOf(model, at(model, minimumVelocity.position)), depth)
  const force = forceOf(model, deepest.force, deepest.position, model.zero.total.sd / 2)
  put(into, 'countermovementDepth', depth)
  put(into, 'legStiffness', budget.over(budget.minus(force, systemWeight), way))

  const filtered = filteredForce(model, onset.position, takeoff.position)
  const { position: fastestDown } = minimumVelocity
  put(into, 'brakingRateOfForce', meanRate(model, filtered, fastestDown, zeroVelocity, brakingTime))
  putPower(model, into, 'peakBrakingPower', extremePower(model, fastestDown, zeroVelocity, -1))
  const start = { position: zeroVelocity, time: times.zeroVelocity, displacement: depth }
  propulsionFigures(model, start, times, takeoffVelocity, filtered, into)
}
