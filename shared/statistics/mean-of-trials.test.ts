import { describe, expect, it } from 'vitest'
import { meanOfTrials, type TrialFigure } from './mean-of-trials.ts'

const figure = (value: number, U: number | null = null, URepeat: number | null = U): TrialFigure => ({
  value,
  U,
  URepeat,
})

describe('the mean of a session’s trials', () => {
  it('is absent without a trial', () => {
    expect(meanOfTrials([], null)).toBeNull()
    expect(meanOfTrials([], { sd: 1, degreesOfFreedom: 9 })).toBeNull()
  })

  it('of one trial is that trial with its own uncertainty where nobody has two', () => {
    expect(meanOfTrials([figure(0.31, 0.012, 0.01)], null)).toEqual({ value: 0.31, U: 0.012, trials: 1 })
  })

  it('of one trial without uncertainty has none', () => {
    expect(meanOfTrials([figure(0.31)], null)).toEqual({ value: 0.31, U: null, trials: 1 })
  })

  it('carries t·s/√n of the session where its trials differ more than the plate errs', () => {
    // t(0.975, 20) = 2.086 (NIST/SEMATECH e-Handbook of Statistical Methods, 1.3.6.7.2).
    const spread = { sd: 0.02, degreesOfFreedom: 20 }
    const mean = meanOfTrials([figure(0.3, 0.001), figure(0.32, 0.001), figure(0.34, 0.001)], spread)
    expect(mean?.value).toBeCloseTo(0.32, 12)
    expect(mean?.U).toBeCloseTo((2.086 * 0.02) / Math.sqrt(3), 5)
  })

  it('of one trial carries the whole spread of the session', () => {
    expect(meanOfTrials([figure(0.3, 0.001)], { sd: 0.02, degreesOfFreedom: 20 })?.U).toBeCloseTo(
      2.086 * 0.02,
      5,
    )
  })

  it('takes t(0.975, 1) = 12.706 where two trials are all that the session has (same table)', () => {
    expect(meanOfTrials([figure(1), figure(3)], { sd: Math.SQRT2, degreesOfFreedom: 1 })?.U).toBeCloseTo(
      12.706,
      2,
    )
  })

  it('carries what the plate says where the trials agree better than the plate errs', () => {
    const four = Array.from({ length: 4 }, () => figure(0.3, 0.01))
    expect(meanOfTrials(four, { sd: 0, degreesOfFreedom: 3 })?.U).toBeCloseTo(0.01 / 2, 12)
  })

  it('does not shrink what is the same in every trial', () => {
    const trials = Array.from({ length: 100 }, () => figure(800, 5, 3))
    expect(meanOfTrials(trials, null)?.U).toBeCloseTo(Math.hypot(4, 3 / 10), 12)
  })

  it('leaves the plate out where it says nothing of one of the trials', () => {
    const mean = meanOfTrials([figure(1, 50), figure(3, null)], { sd: Math.SQRT2, degreesOfFreedom: 1 })
    expect(mean?.U).toBeCloseTo(12.706, 2)
  })

  it('never mixes the two into more than the larger', () => {
    const spread = { sd: 0.2, degreesOfFreedom: 12 }
    const trials = [figure(0.99, 0.4), figure(1.01, 0.4)]
    const plate = meanOfTrials(trials, null)?.U ?? 0
    const varied = meanOfTrials([figure(0.99), figure(1.01)], spread)?.U ?? 0
    expect(meanOfTrials(trials, spread)?.U).toBeCloseTo(Math.max(plate, varied), 12)
  })

  it('leaves what it was given as it was', () => {
    const figures = [Object.freeze(figure(1, 0.1)), Object.freeze(figure(2, 0.1))]
    expect(meanOfTrials(Object.freeze(figures), Object.freeze({ sd: 1, degreesOfFreedom: 2 }))?.trials).toBe(
      2,
    )
  })
})
