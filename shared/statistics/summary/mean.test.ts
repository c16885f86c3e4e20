import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { mean } from './mean.ts'

fc.configureGlobal({ seed: 7 })

const finite = fc.double({ min: -1e6, max: 1e6, noNaN: true })
const several = fc.array(finite, { minLength: 1, maxLength: 40 })
/** What rounding may cost, against the largest value. */
const rounding = (values: readonly number[]) => 1e-15 * Math.max(1, ...values.map(Math.abs)) * 4

describe('the mean', () => {
  it('is absent of nothing', () => expect(mean([])).toBeNull())
  it('of one value is that value', () => expect(mean([0.1])).toBe(0.1))
  it('of two is half-way', () => expect(mean([1, 2])).toBe(1.5))

  it.each([NaN, Infinity, -Infinity])('is absent where %d is among the values: none is left out', (bad) => {
    expect(mean([1, bad, 3])).toBeNull()
  })

  it('holds where the sum is beyond what a number holds', () => {
    expect(mean([1.6e308, 1.6e308])).toBe(1.6e308)
    expect(mean([1.7e308, -1.7e308])).toBe(0)
  })

  it('holds where values are the smallest there are', () => expect(mean([5e-324, 5e-324])).toBe(5e-324))

  it('keeps digits that a plain sum loses', () => expect(mean([1e16, 1, -1e16, 1])).toBe(0.5))

  it('is the same in reverse, up to rounding', () => {
    fc.assert(
      fc.property(several, (values) => {
        const there = mean(values) ?? NaN
        const back = mean([...values].reverse()) ?? NaN
        return Math.abs(there - back) <= rounding(values)
      }),
    )
  })

  it('of equal values is that value, to the last bit', () => {
    fc.assert(
      fc.property(
        finite,
        fc.integer({ min: 1, max: 30 }),
        (value, n) => mean(Array(n).fill(value)) === value,
      ),
    )
  })

  it('shifts with the values and scales with them', () => {
    fc.assert(
      fc.property(
        several,
        finite,
        fc.double({ min: -100, max: 100, noNaN: true }),
        (values, shift, scale) => {
          const centre = mean(values) ?? NaN
          const moved = values.map((value) => scale * value + shift)
          return (
            Math.abs((mean(moved) ?? NaN) - (scale * centre + shift)) <=
            rounding(moved) + 100 * rounding(values)
          )
        },
      ),
    )
  })

  it('lies between the least and the greatest', () => {
    fc.assert(
      fc.property(several, (values) => {
        const centre = mean(values) ?? NaN
        return centre >= Math.min(...values) && centre <= Math.max(...values)
      }),
    )
  })

  it('leaves the values as they were', () => expect(mean(Object.freeze([3, 1, 2]))).toBe(2))
})
