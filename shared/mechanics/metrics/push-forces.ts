import { forceKeys, type ForceKey } from '../catalogue/force.ts'
import { fitParabola, parabolaAt, parabolaNoiseAt, parabolaSlopeAt } from '../signal/local-parabola.ts'
import { findPeak, type Peak } from '../signal/peak.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import type { EventTimes } from './event-times.ts'
import { downwardVelocityOf } from './impulse.ts'
import { forceOf, type JumpModel, type TrialModel } from './trial-model.ts'
import { miss, put, reasons, type Measured } from './measured.ts'

/** Each force's twin per body weight. */
const perBodyWeight = Object.fromEntries(forceKeys.map((key) => [key, `${key}PerBodyWeight`])) as {
  [Key in ForceKey]: `${Key}PerBodyWeight`
}

function peakForceOf(model: TrialModel, peak: Peak): Quantity {
  return forceOf(model, peak.value, peak.position, peak.valueU)
}

/** Greatest force between two positions. */
export function greatestForce(model: TrialModel, from: number, to: number): Quantity {
  const { motion, zero, signal } = model
  return peakForceOf(model, findPeak(motion.force, from, to, 1, zero.total, signal.dt, model.settings))
}

/** Force at an instant within the movement, by a parabola over some milliseconds; the instant itself is unsure. */
export function smoothForceAt(model: TrialModel, position: number, time: Quantity): Quantity {
  const { budget, motion, zero, signal } = model
  const fit = fitParabola(
    motion.force,
    position,
    Math.max(2, Math.round(model.settings.forceWindowS / signal.dt)),
  )
  const value = parabolaAt(fit, position)
  const slope = parabolaSlopeAt(fit, position) / signal.dt
  const read = forceOf(model, value, position, parabolaNoiseAt(fit, position, zero.total))
  return budget.pair(value, 1, read, slope, budget.minus(time, budget.exact(time.value)))
}

/** Mean force over a phase: weight plus change of momentum over time. */
export function meanForce(
  { budget, systemWeight }: TrialModel,
  momentumChange: Quantity,
  duration: Quantity,
): Quantity {
  return budget.plus(systemWeight, budget.over(momentumChange, duration))
}

function allForces(
  model: JumpModel,
  times: EventTimes,
  takeoffVelocity: Quantity,
): Partial<Record<ForceKey, Quantity>> {
  const { budget, events, systemMass } = model
  const { onset, minimumForce, minimumVelocity, zeroVelocity, takeoff } = events
  const peakForce = greatestForce(model, onset.position, takeoff.position)
  const downward = downwardVelocityOf(model)
  if (
    !minimumForce ||
    !minimumVelocity ||
    zeroVelocity === null ||
    !downward ||
    !times.minimumVelocity ||
    !times.zeroVelocity
  )
    return { peakForce }
  const brakingTime = budget.minus(times.zeroVelocity, times.minimumVelocity)
  const propulsionTime = budget.minus(times.takeoff, times.zeroVelocity)
  const momentumUp = budget.times(systemMass, takeoffVelocity)
  const momentumDown = budget.scaled(budget.times(systemMass, downward), -1)
  return {
    peakForce,
    minimumForce: peakForceOf(model, minimumForce),
    forceAtZeroVelocity: smoothForceAt(model, zeroVelocity, times.zeroVelocity),
    peakBrakingForce: greatestForce(model, minimumVelocity.position, zeroVelocity),
    meanBrakingForce: meanForce(model, momentumDown, brakingTime),
    peakPropulsionForce: greatestForce(model, zeroVelocity, takeoff.position),
    meanPropulsionForce: meanForce(model, momentumUp, propulsionTime),
  }
}

/** Enters a force of the push in newtons and per body weight. */
export function putForce(model: TrialModel, into: Measured, key: ForceKey, force: Quantity): void {
  put(into, key, force)
  put(into, perBodyWeight[key], model.budget.over(force, model.bodyWeight))
}

/** Enters the same reason for forces and their twins per body weight. */
export function missForces(into: Measured, keys: readonly ForceKey[], reason: string): void {
  for (const key of keys) miss(into, [key, perBodyWeight[key]], reason)
}

/** Forces of a push with a countermovement. */
export function pushForceFigures(
  model: JumpModel,
  times: EventTimes,
  takeoffVelocity: Quantity,
  into: Measured,
): void {
  const forces = allForces(model, times, takeoffVelocity)
  for (const key of forceKeys) {
    const force = forces[key]
    if (force) putForce(model, into, key, force)
    else missForces(into, [key], reasons.noDip)
  }
}
