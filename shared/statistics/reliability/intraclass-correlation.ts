import { fQuantile } from '../distributions/f-quantile.ts'
import type { Estimate } from '../estimate.ts'
import { isMissing, type Missing } from '../missing.ts'
import { twoWayAnova, type TrialTable, type TwoWayAnova } from './two-way-anova.ts'

/**
 * The six forms of Shrout and Fleiss, each with its confidence interval. A form is null where the estimated variances
 * add up to nothing or less, so that there is no ratio of them; `low` is −Infinity where they do so at that limit.
 */
export interface IntraclassCorrelations {
  /** ICC(1,1): each subject measured by trials of its own. */
  oneWaySingle: Estimate | null
  /** ICC(2,1): absolute agreement; a shift between trials counts as error. */
  agreementSingle: Estimate | null
  /** ICC(3,1): consistency; a shift common to all subjects does not. */
  consistencySingle: Estimate | null
  /** ICC(1,k), ICC(2,k), ICC(3,k): the same of the mean of the k trials. */
  oneWayAverage: Estimate | null
  agreementAverage: Estimate | null
  consistencyAverage: Estimate | null
}

/** A form as numerator and denominator, for a mean square between subjects. Written so that no error at all gives 1. */
type Form = (between: number) => [numerator: number, denominator: number]

/** F quantiles that the mean square between subjects is divided and multiplied by at the limits. */
interface Factors {
  low: number
  high: number
}

function factors(betweenDof: number, errorDof: number, coverage: number): Factors {
  // Neither a shift between trials nor a residual that counts: nothing that an interval could be made of.
  if (Number.isNaN(errorDof)) return { low: 1, high: 1 }
  const p = (1 + coverage) / 2
  return { low: fQuantile(p, betweenDof, errorDof), high: fQuantile(p, errorDof, betweenDof) }
}

function estimate(form: Form, between: number, { low, high }: Factors): Estimate | null {
  const at = (square: number) => {
    const [numerator, denominator] = form(square)
    return denominator > 0 ? numerator / denominator : -Infinity
  }
  const value = at(between)
  return value === -Infinity ? null : { value, low: at(between / low), high: at(between * high) }
}

/**
 * Satterthwaite's degrees of freedom for the error of ICC(2,1) (Shrout, Fleiss 1979, p. 424). An estimate below zero
 * counts as zero: it would give a mean square a weight below zero, where the approximation does not hold.
 */
function agreementDof({ subjects: n, trials: k, msTrials, msResidual }: TwoWayAnova, value: number): number {
  const icc = Math.max(0, value)
  const ofTrials = k * icc * msTrials
  const ofResidual = (n * (1 + (k - 1) * icc) - k * icc) * msResidual
  return ((k - 1) * (n - 1) * (ofTrials + ofResidual) ** 2) / ((n - 1) * ofTrials ** 2 + ofResidual ** 2)
}

/**
 * Intraclass correlations of n subjects (rows) by k trials (columns), with intervals for the two-sided `coverage`.
 * Shrout, Fleiss 1979, Psychol Bull 86:420–428; McGraw, Wong 1996, Psychol Methods 1:30–46. A value is estimated below
 * zero where subjects differ less than chance has it. No spread at all has no correlation.
 */
export function intraclassCorrelations(table: TrialTable, coverage = 0.95): IntraclassCorrelations | Missing {
  const anova = twoWayAnova(table)
  if (isMissing(anova)) return anova
  const { subjects: n, trials: k, msBetween, msWithin, msTrials, msResidual } = anova
  if (msBetween === 0 && msWithin === 0) return { missing: 'no-spread' }
  const single =
    (error: number): Form =>
    (between) => [between - error, between + (k - 1) * error]
  const average =
    (error: number): Form =>
    (between) => [between - error, between]
  const agreementOfOne: Form = (between) => [
    n * (between - msResidual),
    n * between + k * msTrials + (k * n - k - n) * msResidual,
  ]
  const agreementOfMean: Form = (between) => [n * (between - msResidual), n * between + msTrials - msResidual]
  const oneWay = factors(n - 1, n * (k - 1), coverage)
  const consistency = factors(n - 1, (n - 1) * (k - 1), coverage)
  const [numerator, denominator] = agreementOfOne(msBetween)
  const agreement = factors(n - 1, agreementDof(anova, numerator / denominator), coverage)
  return {
    oneWaySingle: estimate(single(msWithin), msBetween, oneWay),
    agreementSingle: estimate(agreementOfOne, msBetween, agreement),
    consistencySingle: estimate(single(msResidual), msBetween, consistency),
    oneWayAverage: estimate(average(msWithin), msBetween, oneWay),
    agreementAverage: estimate(agreementOfMean, msBetween, agreement),
    consistencyAverage: estimate(average(msResidual), msBetween, consistency),
  }
}
