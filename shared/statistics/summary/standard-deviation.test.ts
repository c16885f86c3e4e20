import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { standardDeviation } from './standard-deviation.ts'

fc.configureGlobal({ seed: 7 })

const finite = fc.double({ min: -1e6, max: 1e6, noNaN: true })
const several = fc.array(finite, { minLength: 2, maxLength: 40 })

describe('the standard deviation', () => {
  it('is absent of nothing and of one value', () => {
    expect(standardDeviation([])).toBeNull()
    expect(standardDeviation([5])).toBeNull()
  })

  it('of two values is their distance over √2', () => {
    expect(standardDeviation([3, 7])).toBeCloseTo(4 / Math.SQRT2, 15)
  })

  it.each([NaN, Infinity, -Infinity])('is absent where %d is among the values', (bad) => {
    expect(standardDeviation([1, bad, 3])).toBeNull()
  })

  it('holds where squares are beyond what a number holds, or vanish', () => {
    expect((standardDeviation([1e300, 3e300]) ?? 0) / 1e300).toBeCloseTo(Math.SQRT2, 14)
    expect((standardDeviation([1e-300, 3e-300]) ?? 0) / 1e-300).toBeCloseTo(Math.SQRT2, 14)
  })

  it('is absent where it is itself beyond what a number holds', () => {
    expect(standardDeviation([-1.7e308, 1.7e308])).toBeNull()
  })

  it('keeps its digits far from zero', () => {
    expect(standardDeviation([1e9 + 1, 1e9 + 2, 1e9 + 3])).toBe(1)
  })

  it('is not negative, and exactly zero for equal values', () => {
    fc.assert(fc.property(several, (values) => (standardDeviation(values) ?? -1) >= 0))
    fc.assert(
      fc.property(
        finite,
        fc.integer({ min: 2, max: 30 }),
        (value, n) => standardDeviation(Array(n).fill(value)) === 0,
      ),
    )
  })

  it('does not mind the order or a shift, and scales with the values', () => {
    fc.assert(
      fc.property(several, finite, fc.double({ min: -50, max: 50, noNaN: true }), (values, shift, scale) => {
        const sd = standardDeviation(values) ?? NaN
        const moved = values.map((value) => scale * value + shift).reverse()
        return Math.abs((standardDeviation(moved) ?? NaN) - Math.abs(scale) * sd) <= 1e-6
      }),
    )
  })

  it('leaves the values as they were', () => {
    expect(standardDeviation(Object.freeze([3, 1, 2]))).toBe(1)
  })
})
