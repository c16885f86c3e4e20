import { describe, expect, it } from 'vitest'
import { isMissing } from '../../../shared/statistics/missing.ts'
import { linearRegression } from '../../../shared/statistics/trend/linear-regression.ts'

// Norris (calibration of ozone monitors): NIST Statistical Reference Datasets, linear regression (public domain),
// https://www.itl.nist.gov/div898/strd/lls/data/Norris.shtml
// prettier-ignore
const x = [
  0.2, 337.4, 118.2, 884.6, 10.1, 226.5, 666.3, 996.3, 448.6, 777.0, 558.2, 0.4, 0.6, 775.5, 666.9, 338.0, 447.5,
  11.6, 556.0, 228.1, 995.8, 887.6, 120.2, 0.3, 0.3, 556.8, 339.1, 887.2, 999.0, 779.0, 11.1, 118.3, 229.2, 669.1,
  448.9, 0.5,
]
// prettier-ignore
const y = [
  0.1, 338.8, 118.1, 888.0, 9.2, 228.1, 668.5, 998.5, 449.1, 778.9, 559.2, 0.3, 0.1, 778.1, 668.8, 339.3, 448.9,
  10.8, 557.7, 228.3, 998.0, 888.8, 119.6, 0.3, 0.6, 557.6, 339.3, 888.0, 998.5, 778.9, 10.2, 117.6, 228.9, 668.4,
  449.2, 0.2,
]

describe('NIST’s reference data of a straight line: Norris', () => {
  const fit = linearRegression(x, y)
  if (isMissing(fit)) throw new Error(fit.missing)
  const ratioOfVariance = (fit.slope.value / fit.slope.standardError) ** 2

  it.each([
    ['intercept', fit.intercept.value, -0.262323073774029],
    ['its standard error', fit.intercept.standardError, 0.232818234301152],
    ['slope', fit.slope.value, 1.00211681802045],
    ['its standard error', fit.slope.standardError, 0.429796848199937e-3],
    ['residual standard deviation', fit.residualSd, 0.884796396144373],
    ['sum of squared residuals', fit.dof * fit.residualSd ** 2, 26.6173985294224],
    ['R²', fit.rSquared ?? NaN, 0.999993745883712],
    ['F', ratioOfVariance, 5436385.54079785],
  ])('%s to 10 digits', (_what, value, certified) => {
    expect(Math.abs(value / certified - 1)).toBeLessThan(1e-10)
  })

  it('has 34 degrees of freedom', () => expect(fit.dof).toBe(34))
})
