/**
 * Standard error of measurement SD·√(1 − ICC), in the unit of the standard deviation `sd` of all values.
 * It differs with the form of the ICC; √MSE (`typicalError`) does not, and is preferred (Weir 2005, J Strength Cond Res
 * 19:231–240). null where the ICC is above 1 or either is no number.
 */
export function standardErrorOfMeasurement(sd: number, icc: number): number | null {
  const sem = sd * Math.sqrt(1 - icc)
  return Number.isFinite(sem) && sd >= 0 ? sem : null
}
