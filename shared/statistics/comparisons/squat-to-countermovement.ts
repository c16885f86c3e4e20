import { arePositive, combineU, type Measured } from '../measured.ts'

/**
 * Squat jump over countermovement jump, a ratio of the same figure of both (height as a rule): below 1 where the
 * countermovement adds something. Its reciprocal is known as the eccentric utilisation ratio (McGuigan et al. 2006, J
 * Strength Cond Res 20:992–995). Relative uncertainties add in quadrature: give the repeatable parts.
 * null unless both are above zero.
 */
export function squatToCountermovement(squat: Measured, countermovement: Measured): Measured | null {
  const value = squat.value / countermovement.value
  if (!arePositive(squat, countermovement) || !Number.isFinite(value)) return null
  const U = combineU([
    [1 / countermovement.value, squat.U],
    [value / countermovement.value, countermovement.U],
  ])
  return { value, U }
}
