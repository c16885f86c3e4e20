/**
 * Running sums of a record, so that the mean over any stretch costs one subtraction. Sums are of the distance from
 * the first sample, which keeps their digits.
 */
export interface RunningSums {
  sums: Float64Array
  reference: number
}

export function runningSums(force: Float64Array): RunningSums {
  const reference = force.length > 0 ? force[0] : 0
  const sums = new Float64Array(force.length + 1)
  let sum = 0
  for (let i = 0; i < force.length; i++) {
    sum += force[i] - reference
    sums[i + 1] = sum
  }
  return { sums, reference }
}

/** Mean of the samples from (inclusive) to (exclusive), cut to the record; `NaN` of none. */
export function meanOver({ sums, reference }: RunningSums, from: number, to: number): number {
  const a = Math.max(0, from)
  const b = Math.min(sums.length - 1, to)
  return b > a ? reference + (sums[b] - sums[a]) / (b - a) : NaN
}
