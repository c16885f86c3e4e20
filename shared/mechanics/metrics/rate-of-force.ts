import { lowPass, zeroLagLowPass } from '../signal/butterworth.ts'
import { forceAt } from '../signal/motion.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import { forceOf, type TrialModel } from './trial-model.ts'

/** The force of the push after the low-pass filter, from which rates of force are read. */
export interface FilteredForce {
  /** Position of its first sample in the record. */
  first: number
  force: Float64Array
  /** Standard uncertainty that the noise leaves in it, N. */
  noiseU: number
}

/** Filters the force between two positions, with some more at both ends. */
export function filteredForce(model: TrialModel, from: number, to: number): FilteredForce {
  const { zero, signal, settings, motion } = model
  const pad = Math.round(settings.filterMarginS / signal.dt)
  const first = Math.max(0, Math.floor(from) - pad)
  const last = Math.min(signal.length, Math.ceil(to) + pad)
  const cutoff = Math.min(settings.rateOfForceCutoffHz, settings.filterHighestCutoff * signal.sampleRateHz)
  const passes = Math.min(1, 2 * settings.rateOfForceCutoffHz * signal.dt * zero.total.inflation)
  return {
    first,
    force: zeroLagLowPass(motion.force, first, last, lowPass(cutoff, signal.sampleRateHz)),
    noiseU: zero.total.sd * Math.sqrt(passes),
  }
}

function read({ force, first }: FilteredForce, position: number): number {
  return forceAt(force, position - first)
}

/** Rise of the filtered force from one position to another. */
function riseOf(model: TrialModel, filtered: FilteredForce, from: number, to: number): Quantity {
  const { budget } = model
  return budget.minus(
    forceOf(model, read(filtered, to), to, filtered.noiseU),
    forceOf(model, read(filtered, from), from, filtered.noiseU),
  )
}

/** Mean slope of the filtered force between two positions that lie `duration` apart. */
export function meanRate(
  model: TrialModel,
  filtered: FilteredForce,
  from: number,
  to: number,
  duration: Quantity,
): Quantity {
  return model.budget.over(riseOf(model, filtered, from, to), duration)
}

/** Greatest slope of the filtered force over the window of the settings between two positions. */
export function greatestRate(model: TrialModel, filtered: FilteredForce, from: number, to: number): Quantity {
  const { budget, signal, settings } = model
  const { force, first } = filtered
  const span = settings.rateOfForceWindowS / signal.dt
  let steepest = -Infinity
  let where = from
  for (let i = Math.ceil(from); i + span <= to; i++) {
    const slope = (read(filtered, i + span) - force[i - first]) / settings.rateOfForceWindowS
    if (slope > steepest) {
      steepest = slope
      where = i
    }
  }
  const difference = riseOf(model, filtered, where, where + span)
  return budget.linear(steepest, [[1 / settings.rateOfForceWindowS, difference]])
}
