import { describe, expect, it } from 'vitest'
import { meanOfTrials, type TrialFigure } from './mean-of-trials.ts'

const figure = (value: number, U: number | null = null, URepeat: number | null = U): TrialFigure => ({
  value,
  U,
  URepeat,
})

describe('the mean of a session’s trials', () => {
  it('is absent without a trial', () => {
    expect(meanOfTrials([])).toBeNull()
  })

  it('of one trial is that trial with its own uncertainty', () => {
    expect(meanOfTrials([figure(0.31, 0.012, 0.01)])).toEqual({ value: 0.31, U: 0.012, trials: 1 })
  })

  it('of one trial without uncertainty has none', () => {
    expect(meanOfTrials([figure(0.31)])).toEqual({ value: 0.31, U: null, trials: 1 })
  })

  it('carries t·s/√n where the trials differ more than the plate errs', () => {
    // t(0.975, 2) = 4.303 (NIST/SEMATECH e-Handbook of Statistical Methods, 1.3.6.7.2); s = 0.02, n = 3.
    const mean = meanOfTrials([figure(0.3, 0.001), figure(0.32, 0.001), figure(0.34, 0.001)])
    expect(mean?.value).toBeCloseTo(0.32, 12)
    expect(mean?.U).toBeCloseTo((4.303 * 0.02) / Math.sqrt(3), 4)
  })

  it('of two trials takes t(0.975, 1) = 12.706 (same table)', () => {
    expect(meanOfTrials([figure(1), figure(3)])?.U).toBeCloseTo(12.706, 2)
  })

  it('carries what the plate says where the trials agree better than the plate errs', () => {
    const mean = meanOfTrials([figure(0.3, 0.01), figure(0.3, 0.01), figure(0.3, 0.01), figure(0.3, 0.01)])
    expect(mean?.U).toBeCloseTo(0.01 / 2, 12)
  })

  it('does not shrink what is the same in every trial', () => {
    const trials = Array.from({ length: 100 }, () => figure(800, 5, 3))
    expect(meanOfTrials(trials)?.U).toBeCloseTo(Math.hypot(4, 3 / 10), 12)
  })

  it('leaves the plate out where it says nothing of one of the trials', () => {
    expect(meanOfTrials([figure(1, 50), figure(3, null)])?.U).toBeCloseTo(12.706, 2)
  })

  it('never mixes the two into more than the larger', () => {
    const plate = meanOfTrials([figure(1, 0.4), figure(1, 0.4)])?.U ?? 0
    const spread = meanOfTrials([figure(0.99), figure(1.01)])?.U ?? 0
    expect(meanOfTrials([figure(0.99, 0.4), figure(1.01, 0.4)])?.U).toBeCloseTo(Math.max(plate, spread), 12)
  })

  it('leaves what it was given as it was', () => {
    const figures = [Object.freeze(figure(1, 0.1)), Object.freeze(figure(2, 0.1))]
    expect(meanOfTrials(Object.freeze(figures))?.trials).toBe(2)
  })
})
