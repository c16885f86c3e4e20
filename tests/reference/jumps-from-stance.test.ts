import { describe, expect, it } from 'vitest'
import type { GivenAttempt } from '../../seed/synthetic/attempts.ts'
import { perform } from '../../seed/synthetic/perform.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import { truthOf } from '../../seed/synthetic/truth.ts'
import { analyse } from '../../shared/mechanics/analyse.ts'
import { catalogue, metricKeys } from '../../shared/mechanics/catalogue.ts'
import type { Protocol, TrialAnalysis } from '../../shared/mechanics/types.ts'
import { testOf } from './engine-protocols.ts'

/** One attempt of a still athlete on perfect plates, its truth, and what the engine says of it. */
function analysed(given: GivenAttempt, plates: 1 | 2 = 2, loadKg = 0) {
  const performance = perform({ loadKg }, [given])
  const trial = performance.trials[0] as (typeof performance.trials)[number]
  const recording = recordJump(performance, { durationS: performance.endS, plates })
  const options = { test: testOf(trial), gravity: trial.athlete.gravity, calibrationU: {} }
  const { trials } = analyse(recording, options)
  expect(trials).toHaveLength(1)
  return { truth: truthOf(trial), said: trials[0] as TrialAnalysis }
}

const listed = (protocol: Protocol, plates: 1 | 2) =>
  metricKeys.filter((key) => {
    const { protocols, feet } = catalogue[key]
    return protocols.includes(protocol) && (plates === 2 || !key.startsWith('feet')) && feet !== 'only'
  })

/** Figures to a part of their size that sampling at 1,000 Hz leaves; extremes and slopes are coarser than integrals. */
const tolerance = (key: string) =>
  /LoadingRate|RateOfForce/.test(key) ? 0.03 : /Depth|Stiffness|Work|Power/.test(key) ? 0.006 : 0.004

function expectTrue({ truth, said }: ReturnType<typeof analysed>): void {
  for (const [key, value] of Object.entries(truth.metrics)) {
    const figure = said.metrics[key]
    if (!figure) continue
    const allowed = Math.max(0.0015, tolerance(key) * Math.abs(value))
    expect(Math.abs(figure.value - value), key).toBeLessThan(allowed)
  }
  for (const [name, timeS] of Object.entries(truth.events)) {
    const event = said.events[name as keyof TrialAnalysis['events']]
    if (event) expect(Math.abs(event.timeS - timeS), name).toBeLessThan(0.003)
  }
  expect(said.ledger?.entries.map(({ phase }) => phase)).toEqual(truth.ledger.map(({ phase }) => phase))
  for (const [i, { netImpulse }] of truth.ledger.entries())
    expect(said.ledger?.entries[i]?.netImpulse).toBeCloseTo(netImpulse, 0)
  expect(said.checks.filter(({ verdict }) => verdict === 'fail')).toEqual([])
}

describe('squat jump', () => {
  it.each([1, 2] as const)(
    'on %i plates: every figure of the catalogue, each at its true value',
    (plates) => {
      const found = analysed({ protocol: 'sj' }, plates)
      expectTrue(found)
      expect(Object.keys(found.said.metrics).sort()).toEqual(listed('sj', plates).sort())
      expect(found.said.missing).toEqual([])
      expect(found.said.ledger?.entries[0]?.phase).toBe('propulsion')
    },
  )

  it('begins at the first movement, be it a small dip, and says how deep the dip was', () => {
    const found = analysed({ protocol: 'sj', dipFraction: 0.07 })
    expectTrue(found)
    const dip = found.said.checks.find(({ key }) => key === 'squat-dip')
    expect(dip?.verdict).toBe('caution')
    expect(dip?.measured).toBeCloseTo(7, 0)
  })

  it('fails with a dip beyond the limit, and the landing stands', () => {
    const { said } = analysed({ protocol: 'sj', dipFraction: 0.2 })
    const dip = said.checks.find(({ key }) => key === 'squat-dip')
    expect(dip?.verdict).toBe('fail')
    expect(dip?.affects).toContain('jump')
    expect(dip?.affects).not.toContain('landing')
  })

  it('weighs and begins in the held squat where the athlete stood first', () => {
    expectTrue(analysed({ protocol: 'sj', standsFirstS: 1.5, stanceS: 2 }))
  })
})

describe('countermovement jump on one leg', () => {
  it.each([
    ['left', 1],
    ['left', 2],
    ['right', 2],
  ] as const)('%s, on %i plates: every figure at its true value, and no sides', (side, plates) => {
    const found = analysed({ protocol: 'slcmj', side }, plates)
    expectTrue(found)
    expect(found.said.sides).toBeNull()
    expect(Object.keys(found.said.metrics).sort()).toEqual(listed('slcmj', 1).sort())
    expect(found.said.missing).toEqual([])
  })

  it('fails where the athlete stood on the other leg, or pushed or landed on both', () => {
    const performance = perform({}, [{ protocol: 'slcmj', side: 'right' }])
    const recording = recordJump(performance, { durationS: performance.endS })
    const options = { gravity: 9.80665, calibrationU: {} }
    const test = {
      protocol: 'slcmj',
      side: 'left',
      externalLoadKg: 0,
      boxHeightM: null,
      arms: 'hips',
    } as const
    const failed = (of: typeof recording) =>
      analyse(of, { ...options, test })
        .trials.flatMap(({ checks }) => checks)
        .filter(({ verdict }) => verdict === 'fail')
        .map(({ key }) => key)
    expect(failed(recording)).toEqual(['side-agreement'])
    const both = perform({}, [{ protocol: 'cmj' }])
    expect(failed(recordJump(both, { durationS: both.endS }))).toEqual(
      expect.arrayContaining(['other-foot-off', 'other-foot-landing']),
    )
  })
})

describe('a loaded jump', () => {
  it('fails where the load leaves next to nothing of the athlete', () => {
    const performance = perform({}, [{ protocol: 'cmj' }])
    const recording = recordJump(performance, { durationS: performance.endS })
    const test = { ...testOf(performance.trials[0]), externalLoadKg: 70 }
    const [{ checks }] = analyse(recording, { test, gravity: 9.80665, calibrationU: {} }).trials
    const failed = checks.filter(({ verdict }) => verdict === 'fail')
    expect(failed.map(({ key }) => key)).toEqual(['mass-agreement'])
    expect(failed[0]?.affects).toContain('weighing')
  })

  it('takes body weight for the denominator and system weight for the motion', () => {
    const found = analysed({ protocol: 'cmj', takeoffVelocity: 1.9 }, 2, 40)
    expectTrue(found)
    const { metrics } = found.said
    expect(metrics.systemWeight?.value).toBeCloseTo((metrics.bodyWeight?.value ?? NaN) + 40 * 9.80665, 6)
    expect(metrics.peakForcePerBodyWeight?.value).toBeCloseTo(
      (metrics.peakForce?.value ?? NaN) / (metrics.bodyWeight?.value ?? NaN),
      9,
    )
    expect(metrics.netImpulse?.value).toBeCloseTo(metrics.takeoffMomentum?.value ?? NaN, 9)
  })
})
