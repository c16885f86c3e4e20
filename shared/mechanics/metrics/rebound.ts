import type { MetricKey } from '../catalogue.ts'
import type { ForceKey } from '../catalogue/force.ts'
import type { ReboundEvents } from '../events/drop-events.ts'
import type { Weighing } from '../events/weighing.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import type { MeasuredContact } from './contacts.ts'
import { crossingTime, trialTimes, type TakeoffTime, type TrialTimes } from './event-times.ts'
import {
  flightFigures,
  heightAboveStanding,
  heightOfVelocity,
  takeoffFigures,
  takeoffVelocityOf,
  velocityAtEvent,
} from './jump.ts'
import { miss, put, reasons, type Measured } from './measured.ts'
import { extremePower, putPower } from './power.ts'
import { peakVelocityOf, propulsionFigures } from './propulsion.ts'
import { greatestForce, meanForce, missForces, putForce, smoothForceAt } from './push-forces.ts'
import { at, displacementOf, type TrialModel } from './trial-model.ts'

/** A drop jump. */
export type ReboundModel = TrialModel<Weighing | null, ReboundEvents>

/** Times of the events of a drop jump. */
export interface ReboundTimes extends TrialTimes, TakeoffTime {
  arrival: Quantity
}

/** What needs the deepest point of the contact. */
const turnedKeys: MetricKey[] = [
  'brakingImpulse',
  'propulsionImpulse',
  'brakingTime',
  'propulsionTime',
  'propulsionWork',
  'meanPropulsionPower',
  'meanPropulsionPowerPerKg',
  'peakPower',
  'peakPowerPerKg',
  'peakBrakingPower',
  'peakBrakingPowerPerKg',
]
const turnedForces: ForceKey[] = [
  'forceAtZeroVelocity',
  'peakBrakingForce',
  'meanBrakingForce',
  'peakPropulsionForce',
  'meanPropulsionForce',
]

export function reboundTimes(model: ReboundModel): ReboundTimes {
  const { arrival, takeoff } = model.events
  return {
    arrival: crossingTime(model, arrival),
    takeoff: crossingTime(model, takeoff),
    ...trialTimes(model),
  }
}

/** The fall that ends at a first touch: its velocity, and the height of a free fall that has it. */
export function dropFigures(model: TrialModel, dropVelocity: Quantity, into: Measured): void {
  put(into, 'dropVelocity', dropVelocity)
  put(into, 'effectiveDropHeight', heightOfVelocity(model, dropVelocity))
}

/** Forces, times, power and work of the contact's two halves. */
function turnFigures(
  model: ReboundModel,
  times: ReboundTimes,
  dropVelocity: Quantity,
  takeoffVelocity: Quantity,
  into: Measured,
): void {
  const { budget, events, systemMass } = model
  const { arrival, zeroVelocity, takeoff } = events
  if (zeroVelocity === null || !times.zeroVelocity) {
    missForces(into, turnedForces, reasons.noTurn)
    return miss(into, turnedKeys, reasons.noTurn)
  }
  const brakingTime = budget.minus(times.zeroVelocity, times.arrival)
  const braking = budget.scaled(budget.times(systemMass, dropVelocity), -1)
  const propulsion = budget.times(systemMass, takeoffVelocity)
  put(into, 'brakingImpulse', braking)
  put(into, 'propulsionImpulse', propulsion)
  put(into, 'brakingTime', brakingTime)
  const propulsionTime = budget.minus(times.takeoff, times.zeroVelocity)
  putForce(model, into, 'forceAtZeroVelocity', smoothForceAt(model, zeroVelocity, times.zeroVelocity))
  putForce(model, into, 'peakBrakingForce', greatestForce(model, arrival.position, zeroVelocity))
  putForce(model, into, 'meanBrakingForce', meanForce(model, braking, brakingTime))
  putForce(model, into, 'peakPropulsionForce', greatestForce(model, zeroVelocity, takeoff.position))
  putForce(model, into, 'meanPropulsionForce', meanForce(model, propulsion, propulsionTime))
  putPower(model, into, 'peakBrakingPower', extremePower(model, arrival.position, zeroVelocity, -1))
  const displacement = displacementOf(model, at(model, zeroVelocity))
  const start = { position: zeroVelocity, time: times.zeroVelocity, displacement }
  propulsionFigures(model, start, times, takeoffVelocity, null, into)
}

/** The contact of a drop jump and the jump out of it. */
export function reboundFigures(
  model: ReboundModel,
  times: ReboundTimes,
  contact: MeasuredContact | null,
  into: Measured,
): void {
  const { budget, events, systemMass } = model
  const { arrival, zeroVelocity, takeoff } = events
  const dropVelocity = velocityAtEvent(model, arrival, times.arrival)
  const takeoffVelocity = takeoffVelocityOf(model, times)
  dropFigures(model, dropVelocity, into)
  takeoffFigures(model, takeoffVelocity, into)
  heightAboveStanding(model, times, takeoffVelocity, into)
  flightFigures(model, times, into)
  put(into, 'netImpulse', budget.times(systemMass, budget.minus(takeoffVelocity, dropVelocity)))
  putForce(model, into, 'peakForce', greatestForce(model, arrival.position, takeoff.position))
  put(into, 'peakVelocity', peakVelocityOf(model, zeroVelocity ?? arrival.position, takeoff.position))
  turnFigures(model, times, dropVelocity, takeoffVelocity, into)
  put(into, 'contactTime', contact?.contactTime ?? budget.minus(times.takeoff, times.arrival))
  if (!contact) return miss(into, ['rsi', 'rsiFlightContact'], reasons.noTouchdown)
  put(into, 'rsi', contact.rsi)
  put(into, 'rsiFlightContact', contact.rsiFlightContact)
}
