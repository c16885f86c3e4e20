import { isMissing, type Missing } from '../missing.ts'
import { twoWayAnova, type TrialTable } from '../reliability/two-way-anova.ts'

export interface Repeatability {
  /** Standard deviation within subjects, √MSW; for two trials √(Σd²/2n). */
  withinSd: number
  /** Difference between two trials of a subject that about 95 % stay under. */
  coefficient: number
}

/**
 * Repeatability coefficient multiplier·√2·s_w of one method, subjects by trials, in the unit of the table
 * (Bland, Altman 1986, Lancet i:307–310, who print 2 for the multiplier; 1.96 since). A shift between trials counts.
 */
export function repeatability(table: TrialTable, multiplier = 1.96): Repeatability | Missing {
  const anova = twoWayAnova(table)
  if (isMissing(anova)) return anova
  const withinSd = Math.sqrt(anova.msWithin)
  return { withinSd, coefficient: multiplier * Math.SQRT2 * withinSd }
}
