import { tooFew, type Missing } from '../missing.ts'
import { mean } from '../summary/mean.ts'

/** Mean squares of a table of n subjects (rows) by k trials (columns), in the square of the unit. */
export interface TwoWayAnova {
  subjects: number
  trials: number
  /** Between subjects, n − 1 degrees of freedom (Shrout and Fleiss: BMS). */
  msBetween: number
  /** Within subjects, n(k − 1) (WMS). */
  msWithin: number
  /** Between trials, k − 1 (JMS). */
  msTrials: number
  /** What neither explains, (n − 1)(k − 1) (EMS). */
  msResidual: number
}

/** Subjects by trials: a row a subject, a column a trial. */
export type TrialTable = readonly (readonly number[])[]

const sumOfSquares = (values: readonly number[]) => values.reduce((sum, value) => sum + value * value, 0)

/** Table of deviations from the grand mean; a reason where rows differ in length or a value is not finite. */
function centre(table: TrialTable): number[][] | Missing {
  const trials = table[0]?.length ?? 0
  if (table.some((row) => row.length !== trials)) return { missing: 'unequal-lengths' }
  if (table.length < 2) return tooFew(table.length, 2)
  if (trials < 2) return tooFew(trials, 2)
  const grand = mean(table.flat())
  if (grand === null) return { missing: 'not-finite' }
  return table.map((row) => row.map((value) => value - grand))
}

/**
 * Two-way analysis of variance without replication (Shrout, Fleiss 1979, Psychol Bull 86:420–428, table 2).
 * At least two subjects and two trials, none left out: a reason otherwise.
 */
export function twoWayAnova(table: TrialTable): TwoWayAnova | Missing {
  const centred = centre(table)
  if (!Array.isArray(centred)) return centred
  const [n, k] = [centred.length, centred[0].length]
  const rows = centred.map((row) => mean(row) ?? NaN)
  const columns = centred[0].map((_, trial) => mean(centred.map((row) => row[trial])) ?? NaN)
  const residuals = centred.flatMap((row, i) => row.map((value, j) => value - rows[i] - columns[j]))
  const ssTrials = n * sumOfSquares(columns)
  const ssResidual = sumOfSquares(residuals)
  const anova = {
    subjects: n,
    trials: k,
    msBetween: (k * sumOfSquares(rows)) / (n - 1),
    msWithin: (ssTrials + ssResidual) / (n * (k - 1)),
    msTrials: ssTrials / (k - 1),
    msResidual: ssResidual / ((n - 1) * (k - 1)),
  }
  return Object.values(anova).every(Number.isFinite) ? anova : { missing: 'not-finite' }
}
