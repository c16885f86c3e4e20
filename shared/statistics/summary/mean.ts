import * as simple from 'simple-statistics'
import { scaleToOne } from './scale-to-one.ts'

/**
 * Mean by compensated summation, kept between the least and the greatest value: rounding must not make the mean of equal
 * values another value.
 */
export function meanOfScaled(values: readonly number[]): number {
  const centre = simple.mean([...values])
  return Math.min(simple.max([...values]), Math.max(simple.min([...values]), centre))
}

/** Arithmetic mean Σx/n, in the unit of the values. null of nothing, and where a value is not finite. */
export function mean(values: readonly number[]): number | null {
  const scaled = scaleToOne(values)
  return scaled && meanOfScaled(scaled.values) * scaled.factor
}
