import { describe, expect, it } from 'vitest'
import { studentT } from './student-t.ts'
import { tQuantile } from './t-quantile.ts'

describe('studentT', () => {
  // Quantiles by SciPy 1.17: two-sided coverage 0.95 and 0.99.
  const table: [dof: number, t95: number, t99: number][] = [
    [1, 12.7062, 63.6567],
    [2, 4.3027, 9.9248],
    [3, 3.1824, 5.8409],
    [4, 2.7764, 4.6041],
    [5, 2.5706, 4.0321],
    [7, 2.3646, 3.4995],
    [9, 2.2622, 3.2498],
    [10, 2.2281, 3.1693],
    [15, 2.1314, 2.9467],
    [20, 2.086, 2.8453],
    [30, 2.0423, 2.75],
    [60, 2.0003, 2.6603],
    [120, 1.9799, 2.6174],
  ]
  it.each(table)('meets the table at %i degrees of freedom', (dof, t95, t99) => {
    expect(Math.abs(studentT(0.95, dof) / t95 - 1)).toBeLessThan(4e-5)
    expect(Math.abs(studentT(0.99, dof) / t99 - 1)).toBeLessThan(4e-5)
  })

  it.each([
    [0.6827, 1e-9],
    [0.95, 1e-9],
    [0.99, 1e-8],
    [0.999, 1e-6],
  ])(
    'at a coverage of %f keeps to the exact quantile, whole degrees of freedom or not',
    (coverage, limit) => {
      for (let dof = 1; dof < 1e5; dof *= 1.031) {
        expect(Math.abs(studentT(coverage, dof) / tQuantile((1 + coverage) / 2, dof) - 1)).toBeLessThan(limit)
      }
    },
  )

  it('is not wide between one and two degrees of freedom (SciPy 1.17)', () => {
    expect(studentT(0.95, 1.1)).toBeCloseTo(10.2768012862812, 7)
    expect(studentT(0.95, 1.5)).toBeCloseTo(6.016663104427928, 7)
  })

  it('comes to the normal distribution where nothing is statistical', () => {
    expect(studentT(0.95, Infinity)).toBeCloseTo(1.959964, 6)
    expect(studentT(0.95, NaN)).toBeCloseTo(1.959964, 6)
    expect(studentT(0.6826894921, Infinity)).toBeCloseTo(1, 6)
  })

  it('falls steadily as the degrees of freedom grow, whole or not', () => {
    let last = Infinity
    for (let dof = 1; dof < 200; dof *= 1.07) {
      const t = studentT(0.95, dof)
      expect(t).toBeLessThan(last)
      last = t
    }
  })

  it('takes fewer than one degree of freedom as one', () => {
    expect(studentT(0.95, 0.3)).toBeCloseTo(12.7062, 3)
  })

  it('answers for one coverage after another', () => {
    const [first, second, again] = [studentT(0.95, 6), studentT(0.99, 6), studentT(0.95, 6)]
    expect(second).toBeGreaterThan(first)
    expect(again).toBe(first)
  })
})
