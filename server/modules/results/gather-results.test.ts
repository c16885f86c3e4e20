import { describe, expect, it } from 'vitest'
import type { TrialCheck } from '../../../shared/mechanics/types.ts'
import { gatherResults, type IncludedTrial } from './gather-results.ts'
import { meansOf, spreadsOf } from './means.ts'

const failed: TrialCheck = {
  key: 'landing-length',
  verdict: 'fail',
  affects: ['landing'],
  measured: null,
  limit: null,
  unit: 's',
  sentence: '',
  remedy: '',
}

const trial = (n: number, changes: Partial<IncludedTrial> = {}): IncludedTrial => ({
  trialId: `trial ${n}`,
  analysisId: `analysis ${n}`,
  test: { protocol: 'cmj', side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips' },
  metricValues: { takeoffVelocity: 2.5 + n / 10, landingPeakForcePerBodyWeight: 3 + n },
  metricUncertainties: {
    takeoffVelocity: [0.02, 2, 0.01, 2],
    landingPeakForcePerBodyWeight: [null, 2, null, 2],
  },
  checks: [],
  ...changes,
})

describe('the results of a session', () => {
  it('hold a place for each trial in every array', () => {
    expect(gatherResults([trial(1), trial(2)])).toEqual([
      {
        test: trial(1).test,
        testKey: 'cmj/both/0kg/-/hips',
        trialIds: ['trial 1', 'trial 2'],
        analysisIds: ['analysis 1', 'analysis 2'],
        metricValues: { landingPeakForcePerBodyWeight: [4, 5], takeoffVelocity: [2.6, 2.7] },
        metricU: { landingPeakForcePerBodyWeight: [null, null], takeoffVelocity: [0.02, 0.02] },
        metricURepeat: { landingPeakForcePerBodyWeight: [null, null], takeoffVelocity: [0.01, 0.01] },
      },
    ])
  })

  it('leave the place of a withheld metric empty', () => {
    const [{ metricValues, metricU }] = gatherResults([trial(1), trial(2, { checks: [failed] })])
    expect(metricValues).toEqual({ landingPeakForcePerBodyWeight: [4, null], takeoffVelocity: [2.6, 2.7] })
    expect(metricU.takeoffVelocity).toEqual([0.02, 0.02])
  })

  it('leave the place of a metric empty that only another trial has', () => {
    const [{ metricValues }] = gatherResults([trial(1), trial(2, { metricValues: { takeoffVelocity: 2 } })])
    expect(metricValues.landingPeakForcePerBodyWeight).toEqual([4, null])
  })

  it('keep tests apart that are not comparable', () => {
    const loaded = trial(2, { test: { ...trial(2).test, externalLoadKg: 20 } })
    expect(
      gatherResults([trial(1), loaded, trial(3)]).map(({ testKey, trialIds }) => [testKey, trialIds]),
    ).toEqual([
      ['cmj/both/0kg/-/hips', ['trial 1', 'trial 3']],
      ['cmj/both/20kg/-/hips', ['trial 2']],
    ])
  })

  it('are none without a trial', () => {
    expect(gatherResults([])).toEqual([])
  })
})

describe('the means of a session’s results', () => {
  it('count the trials whose figure stands', () => {
    const [result] = gatherResults([trial(1), trial(2, { checks: [failed] })])
    const means = meansOf(result, {})
    expect(means.takeoffVelocity).toMatchObject({ trials: 2 })
    expect(means.takeoffVelocity.value).toBeCloseTo(2.65, 12)
    expect(means.landingPeakForcePerBodyWeight).toEqual({ value: 4, U: null, trials: 1 })
  })

  it('hold no metric that no trial has', () => {
    expect(Object.keys(meansOf(gatherResults([trial(1)])[0], {})).sort()).toEqual([
      'landingPeakForcePerBodyWeight',
      'takeoffVelocity',
    ])
  })

  it('carry what the trials of the session vary', () => {
    const results = [gatherResults([trial(1), trial(2)])[0], gatherResults([trial(3), trial(5)])[0]]
    const spreads = spreadsOf(results)
    // Two athletes, two trials each: √((2·0.05² + 2·0.1²)/2).
    expect(spreads.takeoffVelocity[0]).toBeCloseTo(Math.sqrt(0.0125), 12)
    expect(spreads.takeoffVelocity[1]).toBe(2)
    // t(0.975, 2) = 4.303 (NIST/SEMATECH e-Handbook of Statistical Methods, 1.3.6.7.2).
    expect(meansOf(results[0], spreads).takeoffVelocity.U).toBeCloseTo(
      (4.303 * Math.sqrt(0.0125)) / Math.SQRT2,
      3,
    )
  })

  it('leave a withheld figure out of the spread', () => {
    const results = [gatherResults([trial(1), trial(2, { checks: [failed] })])[0]]
    expect(Object.keys(spreadsOf(results))).toEqual(['takeoffVelocity'])
  })
})
