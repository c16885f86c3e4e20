import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { isMissing, type Missing } from '../missing.ts'
import { lineAt } from './line-at.ts'
import { linearRegression, type LinearFit } from './linear-regression.ts'
import { trendSlope } from './trend-slope.ts'
import { whereLineMeets } from './where-line-meets.ts'

fc.configureGlobal({ seed: 7 })

function expectFit(result: LinearFit | Missing): LinearFit {
  if (isMissing(result)) throw new Error(`Missing: ${result.missing}`)
  return result
}

const xs = [0, 20, 40, 60, 80]
const ys = [2.61, 2.24, 1.95, 1.6, 1.33]

// NIST's Norris and SciPy's regressions stand in tests/reference.
describe('the straight line by least squares', () => {
  it.each([
    ['nothing', [], [], { missing: 'too-few-values', found: 0, needed: 3 }],
    ['one point', [1], [1], { missing: 'too-few-values', found: 1, needed: 3 }],
    [
      'two points, which leave nothing to tell the error from',
      [1, 2],
      [1, 2],
      { missing: 'too-few-values', found: 2, needed: 3 },
    ],
    ['a point without its fellow', [1, 2, 3], [1, 2], { missing: 'unequal-lengths' }],
    ['x that are all the same', [2, 2, 2], [1, 2, 3], { missing: 'no-spread' }],
    ['NaN', [1, 2, 3], [1, NaN, 3], { missing: 'not-finite' }],
    ['infinity', [1, Infinity, 3], [1, 2, 3], { missing: 'not-finite' }],
    [
      'a slope beyond what a number holds',
      [1e-200, 2e-200, 3e-200],
      [1e200, 2e200, 4e200],
      { missing: 'not-finite' },
    ],
  ])('has a reason for %s', (_what, x, y, reason) => {
    expect(linearRegression(x, y)).toEqual(reason)
  })

  it('finds a line that is one, without error', () => {
    const fit = expectFit(linearRegression([1, 2, 3, 10], [3, 5, 7, 21]))
    expect(fit.slope.value).toBeCloseTo(2, 14)
    expect(fit.intercept.value).toBeCloseTo(1, 13)
    expect(fit.residualSd).toBeLessThan(1e-14)
    expect(fit.rSquared).toBeCloseTo(1, 14)
  })

  it('of constant values is level, and explains nothing of no variance', () => {
    expect(expectFit(linearRegression([1, 2, 3], [0.1, 0.1, 0.1]))).toMatchObject({
      slope: { value: 0, low: 0, high: 0 },
      residualSd: 0,
      rSquared: null,
    })
  })

  it('keeps its digits far from zero, and for huge values', () => {
    const far = expectFit(linearRegression([1e9 + 1, 1e9 + 2, 1e9 + 3, 1e9 + 4], [1, 2, 4, 5]))
    const near = expectFit(linearRegression([1, 2, 3, 4], [1, 2, 4, 5]))
    expect(far.slope.high).toBeCloseTo(near.slope.high, 13)
    const huge = expectFit(linearRegression([1e-100, 2e-100, 3e-100, 4e-100], [1e100, 2e100, 4e100, 5e100]))
    expect(huge.slope.value / 1e200).toBeCloseTo(near.slope.value, 13)
    expect(huge.residualSd / 1e100).toBeCloseTo(near.residualSd, 13)
    expect(huge.rSquared).toBeCloseTo(near.rSquared ?? NaN, 13)
  })

  it('does not mind the order of the points, and follows shifts and units of both axes', () => {
    const point = fc.tuple(fc.integer({ min: -40, max: 40 }), fc.double({ min: -50, max: 50, noNaN: true }))
    const points = fc.uniqueArray(point, { minLength: 3, maxLength: 15, selector: ([x]) => x })
    const unit = fc.double({ min: 0.1, max: 10, noNaN: true })
    fc.assert(
      fc.property(points, unit, unit, fc.integer({ min: -90, max: 90 }), (all, ofX, ofY, shift) => {
        const here = expectFit(
          linearRegression(
            all.map(([x]) => x),
            all.map(([, y]) => y),
          ),
        )
        const turned = [...all].reverse()
        const there = expectFit(
          linearRegression(
            turned.map(([x]) => ofX * (x + shift)),
            turned.map(([, y]) => ofY * (y + shift)),
          ),
        )
        const factor = ofY / ofX
        return (
          Math.abs(there.slope.value - factor * here.slope.value) <
            1e-8 * (1 + factor * Math.abs(here.slope.value)) &&
          Math.abs(there.slope.standardError - factor * here.slope.standardError) < 1e-8 * factor * 100 &&
          Math.abs(there.residualSd - ofY * here.residualSd) < 1e-8 * ofY * 100
        )
      }),
    )
  })
})

describe('the line at a place', () => {
  const fit = expectFit(linearRegression(xs, ys))

  it('is the intercept at zero, with the interval of the intercept', () => {
    const there = lineAt(fit, 0)
    expect(there.value).toBeCloseTo(fit.intercept.value, 13)
    expect(there.low).toBeCloseTo(fit.intercept.low, 13)
    expect(there.high).toBeCloseTo(fit.intercept.high, 13)
  })

  it('is surest in the middle of the points', () => {
    const width = (x: number) => lineAt(fit, x).high - lineAt(fit, x).low
    expect(width(40)).toBeLessThan(width(0))
    expect(width(0)).toBeCloseTo(width(80), 12)
  })
})

describe('where a line meets a level', () => {
  const fit = expectFit(linearRegression(xs, ys))

  it('is where it takes the value, between where the band of the line does', () => {
    for (const level of [0, 1.5, 3]) {
      const place = whereLineMeets(fit, level)
      if (isMissing(place)) throw new Error(place.missing)
      expect(lineAt(fit, place.value).value).toBeCloseTo(level, 12)
      expect(lineAt(fit, place.low).low).toBeCloseTo(level, 12)
      expect(lineAt(fit, place.high).high).toBeCloseTo(level, 12)
    }
  })

  it('is not told where the slope may be none', () => {
    const flat = expectFit(linearRegression([1, 2, 3, 4], [1, 3, 2, 2.1]))
    expect(whereLineMeets(flat, 5)).toEqual({ missing: 'slope-not-clear' })
    const level = expectFit(linearRegression([1, 2, 3], [1, 1, 1]))
    expect(whereLineMeets(level, 5)).toEqual({ missing: 'slope-not-clear' })
  })
})

describe('the slope of a trend', () => {
  it.each([
    ['rise', [30, 31.1, 31.9, 33.2, 34]],
    ['fall', [34, 33.2, 31.9, 31.1, 30]],
    [null, [30, 34, 31, 33, 32]],
  ])('says %s', (direction, values) => {
    const trend = trendSlope([0, 7, 14, 21, 28], values)
    if (isMissing(trend)) throw new Error(trend.missing)
    expect(trend.direction).toBe(direction)
    expect(trend.n).toBe(5)
    expect(trend.slope.low < 0 && trend.slope.high > 0).toBe(direction === null)
  })

  it('has a reason for too few sessions, or all on one day', () => {
    expect(trendSlope([0, 7], [1, 2])).toEqual({ missing: 'too-few-values', found: 2, needed: 3 })
    expect(trendSlope([7, 7, 7], [1, 2, 3])).toEqual({ missing: 'no-spread' })
  })
})
