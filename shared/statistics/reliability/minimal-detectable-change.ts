import { tQuantile } from '../distributions/t-quantile.ts'

/**
 * Least change between two single measurements of a subject that is real at the two-sided `coverage`: q·√2·SEM, in the
 * unit of the SEM (Weir 2005, J Strength Cond Res 19:231–240, with q = 1.96 of the normal distribution). Where the SEM
 * comes from few measurements give its degrees of freedom `dof`: q is then Student's t.
 * null where the SEM is negative or no number, and for less than one degree of freedom.
 */
export function minimalDetectableChange(sem: number, coverage = 0.95, dof = Infinity): number | null {
  if (!(sem >= 0 && sem < Infinity) || !(dof >= 1)) return null
  return tQuantile((1 + coverage) / 2, dof) * Math.SQRT2 * sem
}
