import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { coefficientOfVariation } from './coefficient-of-variation.ts'

fc.configureGlobal({ seed: 7 })

describe('the coefficient of variation', () => {
  it('is absent of nothing and of one value', () => {
    expect(coefficientOfVariation([])).toBeNull()
    expect(coefficientOfVariation([5])).toBeNull()
  })

  it('of two values is 100·s over the mean', () => {
    expect(coefficientOfVariation([9, 11])).toBeCloseTo((100 * Math.SQRT2) / 10, 12)
  })

  it('of values below zero (a depth) is that of their magnitudes', () => {
    expect(coefficientOfVariation([-9, -11])).toBe(coefficientOfVariation([9, 11]))
  })

  it.each([
    ['zero', [0, 1, 2]],
    ['zero at the end', [1, 2, 0]],
    ['both signs', [-1, 2]],
    ['NaN', [1, NaN]],
    ['infinity', [1, Infinity]],
  ])('is absent with %s among the values', (_what, values) => {
    expect(coefficientOfVariation(values)).toBeNull()
  })

  it('holds for huge values', () =>
    expect(coefficientOfVariation([1e300, 3e300])).toBeCloseTo(50 * Math.SQRT2, 11))

  it('is zero for equal values, and does not mind the unit or the order', () => {
    const positive = fc.array(fc.double({ min: 0.1, max: 1e4, noNaN: true }), { minLength: 2, maxLength: 20 })
    fc.assert(
      fc.property(positive, fc.double({ min: 1e-3, max: 1e3, noNaN: true }), (values, unit) => {
        const cv = coefficientOfVariation(values) ?? NaN
        const other = coefficientOfVariation(values.map((value) => value * unit).reverse()) ?? NaN
        return Math.abs(cv - other) < 1e-9
      }),
    )
    expect(coefficientOfVariation([0.1, 0.1, 0.1])).toBe(0)
  })
})
