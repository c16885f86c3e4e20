import { describe, expect, it } from 'vitest'
import { minimalDetectableChange } from './minimal-detectable-change.ts'
import { smallestWorthwhileChange } from './smallest-worthwhile-change.ts'
import { standardErrorOfMeasurement } from './standard-error-of-measurement.ts'

describe('the standard error of measurement', () => {
  it('is SD·√(1 − ICC)', () => expect(standardErrorOfMeasurement(10, 0.91)).toBeCloseTo(3, 12))
  it('is nothing where measurements repeat perfectly', () =>
    expect(standardErrorOfMeasurement(10, 1)).toBe(0))
  it('is more than the SD where the ICC is below zero', () => {
    expect(standardErrorOfMeasurement(10, -0.2)).toBeGreaterThan(10)
  })

  it.each([
    [10, 1.1],
    [-1, 0.5],
    [NaN, 0.5],
    [10, NaN],
    [Infinity, 0.5],
  ])('is absent for SD %d and ICC %d', (sd, icc) => {
    expect(standardErrorOfMeasurement(sd, icc)).toBeNull()
  })
})

describe('the minimal detectable change', () => {
  it('is 1.96·√2·SEM by the normal distribution', () => {
    expect(minimalDetectableChange(1)).toBeCloseTo(1.959963984540054 * Math.SQRT2, 13)
  })

  it('is larger by Student’s t, and comes to the normal one with the degrees of freedom', () => {
    expect(minimalDetectableChange(1, 0.95, 7)).toBeCloseTo(2.364624251592785 * Math.SQRT2, 12)
    expect(minimalDetectableChange(1, 0.95, 1e9)).toBeCloseTo(minimalDetectableChange(1) ?? 0, 7)
  })

  it('grows with the coverage asked for, and with the SEM', () => {
    expect(minimalDetectableChange(1, 0.99)).toBeGreaterThan(minimalDetectableChange(1, 0.9) ?? Infinity)
    expect(minimalDetectableChange(2e300)).toBeCloseTo(2e300 * 1.959963984540054 * Math.SQRT2, -290)
    expect(minimalDetectableChange(0)).toBe(0)
  })

  it.each([
    [NaN, Infinity],
    [-1, Infinity],
    [Infinity, Infinity],
    [1, 0],
    [1, NaN],
  ])('is absent for a SEM of %d with %d degrees of freedom', (sem, dof) => {
    expect(minimalDetectableChange(sem, 0.95, dof)).toBeNull()
  })
})

describe('the smallest worthwhile change', () => {
  it('is a fifth of the spread between subjects', () =>
    expect(smallestWorthwhileChange(5)).toBeCloseTo(1, 14))
  it('is of their true spread where the typical error is known', () => {
    expect(smallestWorthwhileChange(5, 3)).toBeCloseTo(0.8, 14)
    expect(smallestWorthwhileChange(5, 3, 0.5)).toBeCloseTo(2, 14)
  })

  it.each([
    ['no spread', 0, 0],
    ['an error as large as the spread', 3, 3],
    ['an error larger than the spread', 3, 4],
    ['NaN', NaN, 0],
    ['NaN as the error', 3, NaN],
    ['an error below zero', 3, -1],
    ['infinity', Infinity, 0],
  ])('is absent with %s', (_what, sd, error) => {
    expect(smallestWorthwhileChange(sd, error)).toBeNull()
  })
})
