import { mean } from './mean.ts'
import { standardDeviation } from './standard-deviation.ts'

/**
 * Coefficient of variation 100·s/|x̄|, %. A share of the mean says something only of values of one sign: null where
 * zero or both signs are among them, of fewer than two, and where a value is not finite.
 */
export function coefficientOfVariation(values: readonly number[]): number | null {
  const sign = Math.sign(values[0] ?? 0)
  if (sign === 0 || values.some((value) => Math.sign(value) !== sign)) return null
  const centre = mean(values)
  const sd = standardDeviation(values)
  return centre === null || sd === null ? null : (100 * sd) / Math.abs(centre)
}
