import { describe, expect, it } from 'vitest'
import { isMissing } from '../missing.ts'
import { bilateralDeficit } from './bilateral-deficit.ts'
import { loadVelocityLine } from './load-velocity-line.ts'
import { squatToCountermovement } from './squat-to-countermovement.ts'

const figure = (value: number, U: number | null = null) => ({ value, U })

describe('the squat-to-countermovement ratio', () => {
  it('is squat over countermovement, relative uncertainties in quadrature', () => {
    const ratio = squatToCountermovement(figure(0.3, 0.006), figure(0.4, 0.006))
    expect(ratio?.value).toBeCloseTo(0.75, 14)
    expect(ratio?.U).toBeCloseTo(0.75 * Math.hypot(0.02, 0.015), 14)
  })

  it('has no uncertainty where either has none', () => {
    expect(squatToCountermovement(figure(0.3, 0.006), figure(0.4))?.U).toBeNull()
  })

  it.each([
    [0, 0.4],
    [0.3, 0],
    [-0.3, 0.4],
    [NaN, 0.4],
    [0.3, Infinity],
    [1e300, 1e-300],
  ])('is absent for %d over %d', (squat, countermovement) => {
    expect(squatToCountermovement(figure(squat), figure(countermovement))).toBeNull()
  })
})

describe('the bilateral deficit', () => {
  it('is what both legs together lack of the two single ones', () => {
    expect(bilateralDeficit(figure(0.15), figure(0.17), figure(0.28))?.value).toBeCloseTo(12.5, 12)
  })

  it('is below zero where both legs together do better, and zero where they add up', () => {
    expect(bilateralDeficit(figure(0.15), figure(0.17), figure(0.36))?.value).toBeCloseTo(-12.5, 12)
    expect(bilateralDeficit(figure(1), figure(1), figure(2))?.value).toBe(0)
  })

  it('moves by its uncertainty as its figures do', () => {
    const at = (left: number, right: number, both: number) =>
      bilateralDeficit(figure(left), figure(right), figure(both))?.value ?? NaN
    const step = 1e-6
    const parts = [
      (at(0.15 + step, 0.17, 0.28) - at(0.15, 0.17, 0.28)) / step,
      (at(0.15, 0.17 + step, 0.28) - at(0.15, 0.17, 0.28)) / step,
      (at(0.15, 0.17, 0.28 + step) - at(0.15, 0.17, 0.28)) / step,
    ]
    const expected = Math.hypot(parts[0] * 0.004, parts[1] * 0.005, parts[2] * 0.006)
    const found = bilateralDeficit(figure(0.15, 0.004), figure(0.17, 0.005), figure(0.28, 0.006))
    expect(found?.U).toBeCloseTo(expected, 3)
  })

  it('does not mind which leg is which', () => {
    const here = bilateralDeficit(figure(0.15, 0.01), figure(0.17, 0.02), figure(0.28, 0.01))
    expect(bilateralDeficit(figure(0.17, 0.02), figure(0.15, 0.01), figure(0.28, 0.01))).toEqual(here)
  })

  it.each([
    [0, 1, 2],
    [1, -1, 2],
    [1, 1, NaN],
    [1, Infinity, 2],
  ])('is absent for %d and %d against %d', (left, right, both) => {
    expect(bilateralDeficit(figure(left), figure(right), figure(both))).toBeNull()
  })
})

describe('the load–velocity line', () => {
  it('reaches from the velocity without load to the load at a standstill', () => {
    const line = loadVelocityLine([0, 20, 40, 60], [2.6, 2.21, 1.79, 1.4])
    if (isMissing(line) || isMissing(line.loadAtStandstill)) throw new Error('missing')
    expect(line.fit.slope.value).toBeCloseTo(-0.0201, 10)
    expect(line.velocityWithoutLoad.value).toBeCloseTo(2.603, 10)
    expect(line.loadAtStandstill.value).toBeCloseTo(2.603 / 0.0201, 8)
    expect(line.loadAtStandstill.low).toBeLessThan(line.loadAtStandstill.value)
    expect(line.loadAtStandstill.high).toBeGreaterThan(line.loadAtStandstill.value)
  })

  it('tells no standstill where the line rises, or may be level', () => {
    expect(loadVelocityLine([0, 20, 40], [1, 2, 3])).toMatchObject({
      loadAtStandstill: { missing: 'slope-not-clear' },
    })
    expect(loadVelocityLine([0, 20, 40], [2, 1, 2.1])).toMatchObject({
      loadAtStandstill: { missing: 'slope-not-clear' },
    })
  })

  it('has a reason where there is none', () => {
    expect(loadVelocityLine([0, 20], [2.6, 2.2])).toEqual({ missing: 'too-few-values', found: 2, needed: 3 })
    expect(loadVelocityLine([20, 20, 20], [2.6, 2.2, 2.1])).toEqual({ missing: 'no-spread' })
    expect(loadVelocityLine([0, 20, 40], [2.6, NaN, 2.1])).toEqual({ missing: 'not-finite' })
  })
})
