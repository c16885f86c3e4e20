import { describe, expect, it } from 'vitest'
import { isMissing } from '../../../shared/statistics/missing.ts'
import { intraclassCorrelations } from '../../../shared/statistics/reliability/intraclass-correlation.ts'
import { minimalDetectableChange } from '../../../shared/statistics/reliability/minimal-detectable-change.ts'
import { standardErrorOfMeasurement } from '../../../shared/statistics/reliability/standard-error-of-measurement.ts'
import {
  typicalError,
  typicalErrorOfTwo,
  typicalErrorPercent,
} from '../../../shared/statistics/reliability/typical-error.ts'
import { twoWayAnova } from '../../../shared/statistics/reliability/two-way-anova.ts'
import { standardDeviation } from '../../../shared/statistics/summary/standard-deviation.ts'

// Weir 2005, J Strength Cond Res 19:231–240, table 1, data set A. The paper prints SEM 7.6 (p. 236); further digits are
// worked with SciPy 1.17. Data set B is from memory: it has the same means and the same error, and far less spread
// between subjects, which is what the paper shows by it.
const a1 = [146, 148, 170, 90, 157, 156, 176, 205]
const a2 = [140, 152, 152, 99, 145, 153, 167, 218]
const b1 = [166, 168, 160, 150, 147, 146, 156, 155]
const b2 = [160, 172, 142, 159, 135, 143, 147, 168]

const table = (first: number[], second: number[]) => first.map((value, i) => [value, second[i]])

const expected = [
  {
    set: 'A',
    rows: table(a1, a2),
    msBetween: 2098.535714,
    single: [0.950053, 0.949975, 0.947016],
    average: [0.974387, 0.974346, 0.972787],
    sd: 31.748753,
    percent: 5.161627,
  },
  {
    set: 'B',
    rows: table(b1, b2),
    msBetween: 189.964286,
    single: [0.55891, 0.552749, 0.537728],
    average: [0.717052, 0.711962, 0.69938],
    sd: 10.831282,
    percent: 5.05772,
  },
]

describe.each(expected)('Weir 2005, data set $set', ({ rows, msBetween, single, average, sd, percent }) => {
  it('has its analysis of variance', () => {
    const anova = twoWayAnova(rows)
    if (isMissing(anova)) throw new Error(anova.missing)
    expect(anova.msBetween).toBeCloseTo(msBetween, 6)
    expect(anova.msWithin).toBeCloseTo(53.75, 10)
    expect(anova.msTrials).toBeCloseTo(30.25, 10)
    expect(anova.msResidual).toBeCloseTo(57.107143, 6)
  })

  it('has its correlations', () => {
    const icc = intraclassCorrelations(rows)
    if (isMissing(icc)) throw new Error(icc.missing)
    const singles = [icc.oneWaySingle, icc.agreementSingle, icc.consistencySingle]
    const averages = [icc.oneWayAverage, icc.agreementAverage, icc.consistencyAverage]
    singles.forEach((form, i) => expect(form?.value).toBeCloseTo(single[i], 6))
    averages.forEach((form, i) => expect(form?.value).toBeCloseTo(average[i], 6))
  })

  it('has the same standard error of measurement, 7.6, as typical error of its table and of its two trials', () => {
    const ofTable = typicalError(rows)
    const ofTwo = typicalErrorOfTwo(
      rows.map(([first]) => first),
      rows.map(([, second]) => second),
    )
    if (isMissing(ofTable) || isMissing(ofTwo)) throw new Error('missing')
    expect(ofTable.value.toFixed(1)).toBe('7.6')
    expect(ofTable.value).toBeCloseTo(7.556927, 6)
    expect(ofTwo.value).toBeCloseTo(ofTable.value, 12)
    expect(ofTable.low).toBeCloseTo(4.996445, 6)
    expect(ofTable.high).toBeCloseTo(15.380402, 6)
    expect(ofTable.dof).toBe(7)
  })

  it('has its minimal detectable change, by the normal distribution and by Student’s t', () => {
    const te = typicalError(rows)
    if (isMissing(te)) throw new Error(te.missing)
    // The paper's 1.96 against 1.959964.
    expect(minimalDetectableChange(te.value)).toBeCloseTo(20.946732, 3)
    expect(minimalDetectableChange(te.value, 0.95, te.dof)).toBeCloseTo(25.270996, 5)
  })

  it('has a typical error as a coefficient of variation', () => {
    const te = typicalErrorPercent(rows)
    if (isMissing(te)) throw new Error(te.missing)
    expect(te.value).toBeCloseTo(percent, 6)
  })

  it('has a standard error from SD and ICC that differs with the form of the ICC', () => {
    const all = standardDeviation(rows.flat())
    expect(all).toBeCloseTo(sd, 6)
    const [oneWay, , consistency] = single.map((icc) => standardErrorOfMeasurement(all ?? NaN, icc) ?? NaN)
    expect(oneWay).toBeLessThan(consistency)
    expect(Math.abs(consistency - 7.556927)).toBeLessThan(0.35)
  })
})
