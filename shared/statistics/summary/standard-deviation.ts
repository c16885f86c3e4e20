import * as simple from 'simple-statistics'
import { meanOfScaled } from './mean.ts'
import { scaleToOne } from './scale-to-one.ts'

/**
 * Sample standard deviation √(Σ(x − x̄)²/(n − 1)), in the unit of the values; zero where they are all the same.
 * null of fewer than two, and where a value is not finite or the figure is beyond what a number holds.
 */
export function standardDeviation(values: readonly number[]): number | null {
  const scaled = scaleToOne(values)
  if (!scaled || values.length < 2) return null
  const centre = meanOfScaled(scaled.values)
  const sd = simple.sampleStandardDeviation(scaled.values.map((value) => value - centre)) * scaled.factor
  return Number.isFinite(sd) ? sd : null
}
