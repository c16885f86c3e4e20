import type { Quantity } from '../uncertainty/budget.ts'
import type { TrialModel } from './trial-model.ts'

/** So much of the empty plates around the middle of the zero's stretch is looked at, s. */
const lookedAtS = 0.24

/**
 * How rough a stretch of force is from sample to sample: mean square of second over that of first differences. White
 * noise has 3, and keeps near it over any slow noise; what a low-pass has smoothed has less. NaN without noise.
 */
export function roughnessOf(force: Float64Array, from: number, to: number): number {
  let first = 0
  let second = 0
  for (let i = from + 2; i < to; i++) {
    const now = force[i] - force[i - 1]
    const before = force[i - 1] - force[i - 2]
    first += now * now
    second += (now - before) * (now - before)
  }
  return second / first
}

/**
 * Error of contact times from the recorder: its low-pass delays a takeoff by more than a steep first touch. Where the
 * noise of the empty plates lacks its quick part, there is such a low-pass, and the error is larger.
 */
export function recorderDelay({ budget, signal, zero, settings }: TrialModel): Quantity {
  const half = Math.round(lookedAtS / 2 / signal.dt)
  const from = Math.max(0, Math.floor(zero.centre) - half)
  const to = Math.min(signal.length, Math.floor(zero.centre) + half)
  const isSmoothed = roughnessOf(signal.total, from, to) < settings.smoothedRoughness
  return budget.input(0, isSmoothed ? settings.smoothedDelayU : settings.recorderDelayU)
}
