import type { MetricKey } from '../catalogue.ts'
import { velocityAtCrossing } from '../events/jump-events.ts'
import { extremeVelocity, placeWeightCrossing } from '../events/turning-points.ts'
import { lowPass, zeroLagLowPass } from '../signal/butterworth.ts'
import { forceAt } from '../signal/motion.ts'
import { findPeak } from '../signal/peak.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import type { EventTimes } from './event-times.ts'
import { downwardVelocityOf } from './impulse.ts'
import { at, displacementOf, forceOf, velocityOf, type JumpModel } from './jump-model.ts'
import { miss, put, reasons, type Measured } from './measured.ts'

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

/** Greatest (sign 1) or most negative (sign −1) power between two positions. */
function extremePower(model: JumpModel, from: number, to: number, sign: 1 | -1): Quantity {
  const { budget, motion, zero, signal } = model
  const first = Math.max(motion.first, Math.floor(from) - 2)
  const last = Math.min(signal.length - 1, Math.ceil(to) + 2)
  const power = new Float64Array(last - first + 1)
  for (let i = first; i <= last; i++) power[i - first] = motion.force[i] * motion.velocity[i]
  let speed = 0
  for (let i = first; i <= last; i++) speed = Math.max(speed, Math.abs(motion.velocity[i]))
  const noise = { ...zero.total, sd: zero.total.sd * speed }
  const peak = findPeak(power, from - first, to - first, sign, noise, signal.dt, model.settings)
  const instant = at(model, peak.position + first)
  const force = peak.value / instant.velocity
  return budget.linear(peak.value, [
    [instant.velocity, forceOf(model, force, instant.position, peak.valueU / Math.abs(instant.velocity))],
    [force, velocityOf(model, instant)],
  ])
}

/** Standard uncertainty that the noise leaves in low-pass filtered force: the share of the band that passes. */
function filteredNoise({ zero, settings, signal }: JumpModel): number {
  const share = Math.min(1, 2 * settings.rateOfForceCutoffHz * signal.dt * zero.total.inflation)
  return zero.total.sd * Math.sqrt(share)
}

function ratesOfForce(model: JumpModel, brakingTime: Quantity): { braking: Quantity; propulsion: Quantity } {
  const { budget, events, signal, settings, motion } = model
  const pad = Math.round(0.1 / signal.dt)
  const first = Math.max(0, Math.floor(events.onset.position) - pad)
  const last = Math.min(signal.length, Math.ceil(events.takeoff.position) + pad)
  const filtered = zeroLagLowPass(
    motion.force,
    first,
    last,
    lowPass(Math.min(settings.rateOfForceCutoffHz, 0.45 * signal.sampleRateHz), signal.sampleRateHz),
  )
  const read = (position: number) => forceAt(filtered, position - first)
  const u = filteredNoise(model)
  const lowest = events.minimumVelocity?.position ?? 0
  const deepest = events.zeroVelocity ?? 0
  const rise = budget.minus(
    forceOf(model, read(deepest), deepest, u),
    forceOf(model, read(lowest), lowest, u),
  )
  const span = settings.rateOfForceWindowS / signal.dt
  let steepest = -Infinity
  let where = deepest
  for (let i = Math.ceil(deepest); i + span <= events.takeoff.position; i++) {
    const slope = (read(i + span) - filtered[i - first]) / settings.rateOfForceWindowS
    if (slope > steepest) {
      steepest = slope
      where = i
    }
  }
  const difference = budget.minus(
    forceOf(model, read(where + span), where + span, u),
    forceOf(model, read(where), where, u),
  )
  return {
    braking: budget.over(rise, brakingTime),
    propulsion: budget.linear(steepest, [[1 / settings.rateOfForceWindowS, difference]]),
  }
}

function peakVelocityOf(model: JumpModel): Quantity {
  const { motion, events, zero } = model
  const from = events.zeroVelocity ?? events.onset.position
  const fastest = extremeVelocity(motion, from, events.takeoff.position, 1)
  return velocityOf(
    model,
    at(model, placeWeightCrossing(motion, fastest, zero.total, model.settings).position),
  )
}

function putPower(
  model: JumpModel,
  into: Measured,
  key: 'peakPower' | 'meanPropulsionPower' | 'peakBrakingPower',
  power: Quantity,
) {
  put(into, key, power)
  put(into, `${key}PerKg`, model.budget.over(power, model.bodyMass))
}

/** Times, velocities, depth, stiffness, power and work of the push. */
export function pushFigures(
  model: JumpModel,
  times: EventTimes,
  takeoffVelocity: Quantity,
  into: Measured,
): void {
  const { budget, motion, events, settings, systemWeight, systemMass } = model
  put(into, 'peakVelocity', peakVelocityOf(model))
  const { minimumVelocity, zeroVelocity, takeoff } = events
  const downward = downwardVelocityOf(model)
  if (!minimumVelocity || zeroVelocity === null || !downward || !times.minimumVelocity || !times.zeroVelocity)
    return miss(into, dipKeys, reasons.noDip)

  const brakingTime = budget.minus(times.zeroVelocity, times.minimumVelocity)
  const propulsionTime = budget.minus(times.takeoff, times.zeroVelocity)
  put(into, 'unweightingTime', budget.minus(times.minimumVelocity, times.onset))
  put(into, 'brakingTime', brakingTime)
  put(into, 'propulsionTime', propulsionTime)
  put(into, 'peakDownwardVelocity', downward)

  const deepest = at(model, zeroVelocity)
  const depth = displacementOf(model, deepest)
  const way = budget.minus(displacementOf(model, at(model, minimumVelocity.position)), depth)
  const force = forceOf(model, deepest.force, deepest.position, model.zero.total.sd / 2)
  put(into, 'countermovementDepth', depth)
  put(into, 'legStiffness', budget.over(budget.minus(force, systemWeight), way))

  const rates = ratesOfForce(model, brakingTime)
  put(into, 'brakingRateOfForce', rates.braking)
  put(into, 'propulsionRateOfForce', rates.propulsion)

  const atTakeoff = velocityAtCrossing(motion, takeoff, settings)
  const rise = budget.minus(displacementOf(model, atTakeoff), depth)
  const kinetic = budget.scaled(budget.times(systemMass, budget.times(takeoffVelocity, takeoffVelocity)), 0.5)
  const work = budget.plus(kinetic, budget.times(systemWeight, rise))
  put(into, 'propulsionWork', work)
  putPower(model, into, 'meanPropulsionPower', budget.over(work, propulsionTime))
  putPower(model, into, 'peakPower', extremePower(model, zeroVelocity, takeoff.position, 1))
  const braking = extremePower(model, minimumVelocity.position, zeroVelocity, -1)
  putPower(model, into, 'peakBrakingPower', braking)
}
