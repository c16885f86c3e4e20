import { describe, expect, it } from 'vitest'
import { chiSquaredQuantile } from '../../../shared/statistics/distributions/chi-squared-quantile.ts'
import { fQuantile } from '../../../shared/statistics/distributions/f-quantile.ts'
import { normalQuantile } from '../../../shared/statistics/distributions/normal-quantile.ts'
import { tQuantile } from '../../../shared/statistics/distributions/t-quantile.ts'
import { isMissing } from '../../../shared/statistics/missing.ts'
import { linearRegression } from '../../../shared/statistics/trend/linear-regression.ts'
import golden from './golden.json' with { type: 'json' }
import { expectClose } from './expect-close.ts'

const { shares, normal, t, chiSquared, f } = golden.quantiles
const toTenDigits = { relative: 1e-10, absolute: 1e-14 }

describe(`quantiles against SciPy ${golden.madeWith.scipy}`, () => {
  it('normal', () => {
    expectClose(shares.map(normalQuantile), normal, toTenDigits)
  })

  it.each(t)('Student’s t, $dof degrees of freedom', ({ dof, values }) => {
    expectClose(
      shares.map((p) => tQuantile(p, dof)),
      values,
      toTenDigits,
    )
  })

  it.each(chiSquared)('χ², $dof degrees of freedom', ({ dof, values }) => {
    expectClose(
      shares.map((p) => chiSquaredQuantile(p, dof)),
      values,
      toTenDigits,
    )
  })

  it.each(f)('F, $dof degrees of freedom', ({ dof: [between, within], values }) => {
    expectClose(
      shares.map((p) => fQuantile(p, between, within)),
      values,
      toTenDigits,
    )
  })
})

describe(`straight lines against SciPy ${golden.madeWith.scipy}`, () => {
  it.each(golden.regressions)('$name', ({ x, y, coverage, slope, intercept, residualSd, rSquared }) => {
    const fit = linearRegression(x, y, coverage)
    if (isMissing(fit)) throw new Error(fit.missing)
    for (const key of ['value', 'standardError', 'low', 'high'] as const) {
      expectClose([fit.slope[key]], [slope[key]], toTenDigits)
      expectClose([fit.intercept[key]], [intercept[key]], toTenDigits)
    }
    expectClose([fit.residualSd, fit.rSquared ?? NaN], [residualSd, rSquared], {
      relative: 1e-10,
      absolute: 1e-12,
    })
    expect(fit.n).toBe(x.length)
  })
})
