import { chiSquaredQuantile } from '../distributions/chi-squared-quantile.ts'
import type { Estimate } from '../estimate.ts'
import { isMissing, tooFew, type Missing } from '../missing.ts'
import { standardDeviation } from '../summary/standard-deviation.ts'
import { twoWayAnova, type TrialTable } from './two-way-anova.ts'

/** Standard deviation of a subject's repeated measurements, in the unit of the table. */
export interface TypicalError extends Estimate {
  dof: number
}

/** TE·√(ν/χ²) at both tails (Hopkins 2000; the interval of any standard deviation of normal values). */
function withInterval(value: number, dof: number, coverage: number): TypicalError {
  const limit = (share: number) => value * Math.sqrt(dof / chiSquaredQuantile(share, dof))
  return { value, low: limit((1 + coverage) / 2), high: limit((1 - coverage) / 2), dof }
}

/**
 * Typical error of k trials, √MSE of subjects by trials, ν = (n − 1)(k − 1): what repeats of one subject scatter once a
 * shift common to all is taken off (Hopkins 2000, Sports Med 30:1–15). It is Weir's preferred standard error of
 * measurement, too (Weir 2005, J Strength Cond Res 19:231–240).
 */
export function typicalError(table: TrialTable, coverage = 0.95): TypicalError | Missing {
  const anova = twoWayAnova(table)
  if (isMissing(anova)) return anova
  const dof = (anova.subjects - 1) * (anova.trials - 1)
  return withInterval(Math.sqrt(anova.msResidual), dof, coverage)
}

/** Typical error of two trials, SD of the differences/√2 with ν = n − 1 (Hopkins 2000): √MSE for k = 2, written shorter. */
export function typicalErrorOfTwo(
  first: readonly number[],
  second: readonly number[],
  coverage = 0.95,
): TypicalError | Missing {
  if (first.length !== second.length) return { missing: 'unequal-lengths' }
  if (first.length < 2) return tooFew(first.length, 2)
  const sd = standardDeviation(second.map((value, i) => value - first[i]))
  return sd === null ? { missing: 'not-finite' } : withInterval(sd / Math.SQRT2, first.length - 1, coverage)
}

/**
 * Typical error as a coefficient of variation, %: 100·(e^TE − 1) with TE of the natural logarithms (Hopkins 2000), for
 * errors that grow with the value. Values above zero only.
 */
export function typicalErrorPercent(table: TrialTable, coverage = 0.95): TypicalError | Missing {
  if (table.some((row) => row.some((value) => value <= 0))) return { missing: 'not-positive' }
  const logs = typicalError(
    table.map((row) => row.map((value) => Math.log(value))),
    coverage,
  )
  if (isMissing(logs)) return logs
  const percent = (log: number) => 100 * Math.expm1(log)
  return { value: percent(logs.value), low: percent(logs.low), high: percent(logs.high), dof: logs.dof }
}
