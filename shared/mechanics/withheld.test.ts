import { describe, expect, it } from 'vitest'
import type { MetricGroup, TrialCheck, Verdict } from './types.ts'
import { withheldMetrics } from './withheld.ts'

const check = (verdict: Verdict, ...affects: MetricGroup[]): TrialCheck => ({
  key: 'made-up',
  verdict,
  affects,
  measured: null,
  limit: null,
  unit: '',
  sentence: '',
  remedy: '',
})
const metrics = { takeoffVelocity: 1, landingPeakForce: 2, bodyWeight: 3, ofAnOlderEngine: 4 }

describe('a failed check takes away', () => {
  it('the metrics of the groups it affects and no others', () => {
    const analysis = { metrics, checks: [check('pass', 'jump'), check('fail', 'landing')] }
    expect(withheldMetrics(analysis)).toEqual(['landingPeakForce', 'ofAnOlderEngine'])
  })

  it('what several failed checks affect together', () => {
    const analysis = { metrics, checks: [check('fail', 'jump'), check('fail', 'weighing', 'jump')] }
    expect(withheldMetrics(analysis)).toEqual(['takeoffVelocity', 'bodyWeight', 'ofAnOlderEngine'])
  })

  it('nothing where it is only a caution', () => {
    expect(withheldMetrics({ metrics, checks: [check('caution', 'jump', 'landing', 'weighing')] })).toEqual(
      [],
    )
  })
})
