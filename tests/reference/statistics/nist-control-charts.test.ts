import { describe, expect, it } from 'vitest'
import { isMissing } from '../../../shared/statistics/missing.ts'
import { cusumChart } from '../../../shared/statistics/monitoring/cusum-chart.ts'
import { ewmaChart } from '../../../shared/statistics/monitoring/ewma-chart.ts'

// NIST/SEMATECH e-Handbook of Statistical Methods, https://doi.org/10.18434/M32189

describe('the example of 6.3.2.4, EWMA control charts', () => {
  // https://www.itl.nist.gov/div898/handbook/pmc/section3/pmc324.htm
  // prettier-ignore
  const values = [
    52.0, 47.0, 53.0, 49.3, 50.1, 47.0, 51.0, 50.1, 51.2, 50.5, 49.6, 47.6, 49.9, 51.3, 47.8, 51.2, 52.6, 52.4,
    53.6, 52.1,
  ]
  // prettier-ignore
  const printed = [
    50.60, 49.52, 50.56, 50.18, 50.16, 49.21, 49.75, 49.85, 50.26, 50.33, 50.11, 49.36, 49.52, 50.05, 49.38, 49.92,
    50.73, 51.23, 51.94, 51.99,
  ]
  const options = { target: 50, sd: 2.0539, weight: 0.3, width: 3 }
  const steady = ewmaChart(values, { ...options, limits: 'steady' })
  const exact = ewmaChart(values, options)
  if (isMissing(steady) || isMissing(exact)) throw new Error('missing')

  it('gives the averages that the handbook prints', () => {
    // The handbook rounds as it goes: its averages are off by a hundredth at most.
    steady.forEach((point, i) => expect(Math.abs(point.ewma - printed[i])).toBeLessThan(0.0101))
    expect(steady[19].ewma).toBeCloseTo(51.9882, 4)
  })

  it('gives its limits, 52.5884 and 47.4115 (it cuts √(0.3/1.7) to 0.4201), and no point outside', () => {
    expect(Math.abs(steady[0].high - 52.5884)).toBeLessThan(1e-4)
    expect(Math.abs(steady[0].low - 47.4115)).toBeLessThan(1.1e-4)
    expect(steady.some((point) => point.outside)).toBe(false)
  })

  it.each([
    [1, 48.1515, 51.8485],
    [2, 47.7436, 52.2564],
    [3, 47.5686, 52.4314],
    [10, 47.4126, 52.5874],
  ])('has exact limits at value %i, worked by hand', (t, low, high) => {
    expect(exact[t - 1].low).toBeCloseTo(low, 4)
    expect(exact[t - 1].high).toBeCloseTo(high, 4)
  })
})

describe('the example of 6.3.2.3, CUSUM control charts', () => {
  // https://www.itl.nist.gov/div898/handbook/pmc/section3/pmc323.htm: means of four, target, k and h.
  // prettier-ignore
  const values = [
    324.93, 324.68, 324.73, 324.35, 325.35, 325.23, 324.13, 324.53, 325.23, 324.60, 324.63, 325.15, 328.33, 327.25,
    327.83, 328.50, 326.68, 327.78, 326.88, 328.35,
  ]
  const points = cusumChart(values, { target: 325, slack: 0.3175, limit: 4.1959 })
  if (isMissing(points)) throw new Error(points.missing)

  it('signals a rise from the fourteenth group on, and before it nothing', () => {
    expect(points.map((point) => point.signal)).toEqual([...Array(13).fill(null), ...Array(7).fill('rise')])
  })

  it('has the sums that its rule gives on the printed means', () => {
    const above = [
      0, 0, 0, 0, 0.0325, 0, 0, 0, 0, 0, 0, 0, 3.0125, 4.945, 7.4575, 10.64, 12.0025, 14.465, 16.0275, 19.06,
    ]
    points.forEach((point, i) => expect(point.above).toBeCloseTo(above[i], 9))
    const below: [group: number, sum: number][] = [
      [1, 0],
      [2, 0.0025],
      [4, 0.3325],
      [7, 0.5525],
      [8, 0.705],
      [9, 0.1575],
      [10, 0.24],
      [11, 0.2925],
      [12, 0],
    ]
    for (const [group, sum] of below) expect(points[group - 1].below).toBeCloseTo(sum, 9)
  })
})
