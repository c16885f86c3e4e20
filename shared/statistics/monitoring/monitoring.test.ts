import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { isMissing, type Missing } from '../missing.ts'
import { cusumChart } from './cusum-chart.ts'
import { ewmaChart, type EwmaPoint } from './ewma-chart.ts'
import { predictionScore } from './prediction-score.ts'

fc.configureGlobal({ seed: 7 })

function expectPoints(result: EwmaPoint[] | Missing): EwmaPoint[] {
  if (isMissing(result)) throw new Error(`Missing: ${result.missing}`)
  return result
}

const baseline = [36.1, 35.4, 36.8, 35.9, 36.5, 35.2, 36.0]

describe('the score against a baseline', () => {
  it('allows for how little a short baseline knows (worked with SciPy 1.17)', () => {
    const score = predictionScore(baseline, 33.9)
    if (isMissing(score)) throw new Error(score.missing)
    expect(score.z).toBeCloseTo(-3.698079, 6)
    expect(score.t).toBeCloseTo(-3.459237, 6)
    expect(score.dof).toBe(6)
    expect(score.low).toBeCloseTo(34.5104, 4)
    expect(score.high).toBeCloseTo(37.4611, 4)
    expect(score.outside).toBe(true)
  })

  it('finds the middle inside, and the same on both sides', () => {
    expect(predictionScore(baseline, 36)).toMatchObject({ outside: false })
    const [above, below] = [predictionScore([1, 2, 3, 4, 5], 6), predictionScore([1, 2, 3, 4, 5], 0)]
    if (isMissing(above) || isMissing(below)) throw new Error('missing')
    expect(above.t).toBeCloseTo(-below.t, 13)
  })

  it('does not mind the order or the unit', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 100, noNaN: true }), (unit) => {
        const score = predictionScore(
          [...baseline].reverse().map((value) => unit * value),
          unit * 33.9,
        )
        return !isMissing(score) && Math.abs(score.t + 3.459237) < 1e-5
      }),
    )
  })

  it('has a reason where there is none', () => {
    expect(predictionScore([], 1)).toEqual({ missing: 'too-few-values', found: 0, needed: 5 })
    expect(predictionScore([1, 2, 3, 4], 1)).toEqual({ missing: 'too-few-values', found: 4, needed: 5 })
    expect(predictionScore([1], 1, { fewest: 1 })).toEqual({ missing: 'too-few-values', found: 1, needed: 2 })
    expect(predictionScore([2, 2, 2, 2, 2], 3)).toEqual({ missing: 'no-spread' })
    expect(predictionScore([1, 2, NaN, 4, 5], 3)).toEqual({ missing: 'not-finite' })
    expect(predictionScore([1, 2, 3, 4, 5], NaN)).toEqual({ missing: 'not-finite' })
  })

  it('holds for huge values', () => {
    const score = predictionScore([1e300, 2e300, 3e300], 9e300, { fewest: 3 })
    expect(score).toMatchObject({ z: expect.closeTo(7, 12) as number, dof: 2 })
  })
})

describe('the chart of an exponentially weighted moving average', () => {
  const options = { target: 50, sd: 2, weight: 0.3 }

  it('stays at the target where every value is there', () => {
    const points = expectPoints(ewmaChart([50, 50, 50], options))
    expect(points.map((point) => point.ewma)).toEqual([50, 50, 50])
    expect(points.some((point) => point.outside)).toBe(false)
  })

  it('with all weight on the newest value is that value, within ±L·s', () => {
    const [point] = expectPoints(ewmaChart([57], { ...options, weight: 1 }))
    expect(point).toMatchObject({ ewma: 57, low: 44, high: 56, outside: true })
  })

  it('opens its exact limits towards the steady ones', () => {
    const values = Array(60).fill(50)
    const exact = expectPoints(ewmaChart(values, options))
    const steady = expectPoints(ewmaChart(values, { ...options, limits: 'steady' }))
    for (let i = 1; i < 8; i++) expect(exact[i].high).toBeGreaterThan(exact[i - 1].high)
    expect(exact[59].high).toBeCloseTo(steady[59].high, 8)
    expect(new Set(steady.map((point) => point.high)).size).toBe(1)
  })

  it('follows shifts and units', () => {
    const values = [51, 48, 53, 55, 54]
    const here = expectPoints(ewmaChart(values, options))
    const there = expectPoints(
      ewmaChart(
        values.map((value) => 10 * value + 3),
        { ...options, target: 503, sd: 20 },
      ),
    )
    here.forEach((point, i) => {
      expect(there[i].ewma).toBeCloseTo(10 * point.ewma + 3, 10)
      expect(there[i].low).toBeCloseTo(10 * point.low + 3, 10)
      expect(there[i].outside).toBe(point.outside)
    })
  })

  it('has a reason where there is none, and refuses a weight that is none', () => {
    expect(ewmaChart([], options)).toEqual({ missing: 'too-few-values', found: 0, needed: 1 })
    expect(ewmaChart([50, NaN], options)).toEqual({ missing: 'not-finite' })
    expect(ewmaChart([50], { ...options, sd: 0 })).toEqual({ missing: 'no-spread' })
    expect(ewmaChart([50], { ...options, target: Infinity })).toEqual({ missing: 'not-finite' })
    for (const weight of [0, -1, 1.1, NaN])
      expect(() => ewmaChart([50], { ...options, weight })).toThrow(RangeError)
  })
})

describe('the chart of cumulative sums', () => {
  const options = { target: 10, slack: 0.5, limit: 4 }

  it('adds up what lies beyond the slack, and starts again at zero', () => {
    expect(cusumChart([12, 9, 10.4, 7, 7, 7], options)).toMatchObject([
      { above: 1.5, below: 0, signal: null },
      { above: 0, below: 0.5, signal: null },
      { above: 0, below: 0, signal: null },
      { above: 0, below: 2.5, signal: null },
      { above: 0, below: 5, signal: 'fall' },
      { above: 0, below: 7.5, signal: 'fall' },
    ])
  })

  it('mirrors with the values', () => {
    const values = fc.array(fc.double({ min: 0, max: 20, noNaN: true }), { minLength: 1, maxLength: 30 })
    fc.assert(
      fc.property(values, (series) => {
        const here = cusumChart(series, { ...options, target: 0 })
        const there = cusumChart(
          series.map((value) => -value),
          { ...options, target: 0 },
        )
        if (isMissing(here) || isMissing(there)) return false
        return here.every((point, i) => point.above === there[i].below && point.below === there[i].above)
      }),
    )
  })

  it('has a reason where there is none', () => {
    expect(cusumChart([], options)).toEqual({ missing: 'too-few-values', found: 0, needed: 1 })
    expect(cusumChart([1, NaN], options)).toEqual({ missing: 'not-finite' })
    expect(cusumChart([1], { ...options, limit: NaN })).toEqual({ missing: 'not-finite' })
  })
})
