import { describe, expect, it } from 'vitest'
import { isMissing } from '../../../shared/statistics/missing.ts'
import { intraclassCorrelations } from '../../../shared/statistics/reliability/intraclass-correlation.ts'
import { twoWayAnova } from '../../../shared/statistics/reliability/two-way-anova.ts'

// Shrout, Fleiss 1979, Psychol Bull 86:420–428, tables 2 to 4: six targets, four judges. The published correlations
// have two digits; the further digits and the intervals are worked from their formulas with SciPy 1.17.
const ratings = [
  [9, 2, 5, 8],
  [6, 1, 3, 2],
  [8, 4, 6, 8],
  [7, 1, 2, 6],
  [10, 5, 6, 9],
  [6, 2, 4, 7],
]

describe('the example of Shrout and Fleiss 1979', () => {
  it('has the analysis of variance of their table 3', () => {
    const anova = twoWayAnova(ratings)
    if (isMissing(anova)) throw new Error(anova.missing)
    expect(anova.msBetween).toBeCloseTo(11.241667, 6)
    expect(anova.msWithin).toBeCloseTo(6.263889, 6)
    expect(anova.msTrials).toBeCloseTo(32.486111, 6)
    expect(anova.msResidual).toBeCloseTo(1.019444, 6)
  })

  it.each([
    ['oneWaySingle', 0.17, 0.1657417684, -0.132932, 0.72256],
    ['agreementSingle', 0.29, 0.2897637795, 0.018787, 0.761084],
    ['consistencySingle', 0.71, 0.7148407148, 0.342465, 0.945858],
    ['oneWayAverage', 0.44, 0.4427971337, -0.884442, 0.912415],
    ['agreementAverage', 0.62, 0.6200505476, 0.071137, 0.927232],
    ['consistencyAverage', 0.91, 0.9093155424, 0.675675, 0.985892],
  ] as const)('gives %s as published, %f', (form, published, value, low, high) => {
    const found = intraclassCorrelations(ratings)
    if (isMissing(found)) throw new Error(found.missing)
    const estimate = found[form]
    expect(estimate?.value.toFixed(2)).toBe(published.toFixed(2))
    expect(estimate?.value).toBeCloseTo(value, 10)
    expect(estimate?.low).toBeCloseTo(low, 6)
    expect(estimate?.high).toBeCloseTo(high, 6)
  })
})
