import { findPeak } from '../signal/peak.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import { at, forceOf, velocityOf, type TrialModel } from './trial-model.ts'
import { put, type Measured } from './measured.ts'

/** Greatest (sign 1) or most negative (sign −1) power between two positions. */
export function extremePower(model: TrialModel, from: number, to: number, sign: 1 | -1): Quantity {
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

/** Enters a power and its twin per kilogram of body mass. */
export function putPower(
  model: TrialModel,
  into: Measured,
  key: 'peakPower' | 'meanPropulsionPower' | 'peakBrakingPower',
  power: Quantity,
): void {
  put(into, key, power)
  put(into, `${key}PerKg`, model.budget.over(power, model.bodyMass))
}
