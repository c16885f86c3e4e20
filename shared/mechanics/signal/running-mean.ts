import { borrow } from './workspace.ts'

/**
 * Running sums of a record, so that the mean over any stretch costs one subtraction. Sums are of the distance from
 * the first sample, which keeps their digits.
 */
export interface RunningSums {
  sums: Float64Array
  reference: number
  /** Number of samples summed. */
  length: number
}

/** Sums a record up. `slot` names the workspace's array for them. */
export function runningSums(force: Float64Array, slot: string): RunningSums {
  const reference = force.length > 0 ? force[0] : 0
  const sums = borrow(slot, force.length + 1)
  sums[0] = 0
  const { length } = force
  let sum = 0
  for (let i = 0; i < length; i++) {
    sum += force[i] - reference
    sums[i + 1] = sum
  }
  return { sums, reference, length }
}

/** Mean of the samples from (inclusive) to (exclusive), cut to the record; `NaN` of none. */
export function meanOver(running: RunningSums, from: number, to: number): number {
  const { sums, reference, length } = running
  const a = from > 0 ? from : 0
  const b = to < length ? to : length
  return b > a ? reference + (sums[b] - sums[a]) / (b - a) : NaN
}

/** Mean of the samples up to `half` before and after one, cut to the record. */
export function meanAround(running: RunningSums, sample: number, half: number): number {
  const from = sample - half
  const to = sample + half + 1
  if (from < 0 || to > running.length) return meanOver(running, from, to)
  return running.reference + (running.sums[to] - running.sums[from]) / (to - from)
}
