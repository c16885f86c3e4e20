import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { GivenAttempt } from '../../seed/synthetic/attempts.ts'
import { perform } from '../../seed/synthetic/perform.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import { analyse } from '../../shared/mechanics/analyse.ts'
import { catalogue, type MetricKey } from '../../shared/mechanics/catalogue.ts'
import type { AnalyseOptions, ForceChannel, Recording, TrialAnalysis } from '../../shared/mechanics/types.ts'
import { testOf } from './engine-protocols.ts'

/** A fixed seed: the same trials every time. */
const runs = { numRuns: 6, seed: 9127 }
const seeds = fc.integer({ min: 1, max: 1e6 })
const sides = { left: 0.005, right: 0.005 }

function drawn(given: GivenAttempt, seed: number) {
  const performance = perform({}, [given], seed)
  const [trial] = performance.trials
  const sampling = { sampleRateHz: 1000, durationS: performance.endS }
  const noise = { whiteNoiseN: 2 }
  const recording = recordJump(performance, sampling, { left: noise, right: noise }, seed)
  const options: AnalyseOptions = { test: testOf(trial), gravity: trial.athlete.gravity, calibrationU: sides }
  return { recording, options }
}

function only(recording: Recording, options: AnalyseOptions): TrialAnalysis {
  const { trials } = analyse(recording, options)
  expect(trials).toHaveLength(1)
  return trials[0]
}

function mapped(recording: Recording, change: (force: Float64Array) => Float64Array): Recording {
  const channels = Object.entries(recording.channels) as [ForceChannel, Float64Array][]
  return {
    ...recording,
    channels: Object.fromEntries(channels.map(([name, force]) => [name, change(force)])),
  }
}

/** Figures that are meant to be nothing have no size to compare. */
const nothings = ['closingBalance', 'feetTakeoffLag', 'feetTouchdownLag']
const sized = (trial: TrialAnalysis) =>
  (Object.keys(trial.metrics) as MetricKey[]).filter((key) => !nothings.includes(key))

describe.each<GivenAttempt>([
  { protocol: 'cmj', settleS: 2 },
  { protocol: 'sj', settleS: 2 },
  { protocol: 'slcmj', settleS: 2, side: 'left' },
])('the engine on $protocol', (given) => {
  it('takes off a constant offset', () => {
    fc.assert(
      fc.property(seeds, fc.double({ min: -40, max: 40, noNaN: true }), (seed, offset) => {
        const { recording, options } = drawn(given, seed)
        const a = only(recording, options)
        const b = only(
          mapped(recording, (force) => force.map((newton) => newton + offset)),
          options,
        )
        for (const key of sized(a))
          expect(Math.abs(b.metrics[key].value / a.metrics[key].value - 1), key).toBeLessThan(1e-6)
      }),
      runs,
    )
  })

  it('does not mind empty plates before the athlete steps on, nor after the athlete is gone', () => {
    fc.assert(
      fc.property(seeds, fc.integer({ min: 1300, max: 4000 }), (seed, empty) => {
        const { recording, options } = drawn(given, seed)
        const a = only(recording, options)
        const wider = mapped(recording, (force) => {
          const more = new Float64Array(force.length + 2 * empty)
          more.set(force, empty)
          return more
        })
        const b = only(wider, options)
        for (const name of ['takeoff', 'touchdown'] as const)
          expect((b.events[name]?.timeS ?? NaN) - (a.events[name]?.timeS ?? NaN)).toBeCloseTo(empty / 1000, 3)
        for (const key of sized(a)) {
          // The first tenth of a second on the plates is stepping on: another second may be weighed.
          const allowed = Math.max(a.metrics[key].URepeat ?? 0, 0.02 * Math.abs(a.metrics[key].value))
          expect(Math.abs(b.metrics[key].value - a.metrics[key].value), key).toBeLessThanOrEqual(allowed)
        }
      }),
      runs,
    )
  })

  it('scales with mass and force: velocities and times stay, forces and impulses grow', () => {
    fc.assert(
      fc.property(seeds, fc.double({ min: 0.7, max: 1.6, noNaN: true }), (seed, factor) => {
        const { recording, options } = drawn(given, seed)
        const a = only(recording, options)
        const b = only(
          mapped(recording, (force) => force.map((newton) => factor * newton)),
          options,
        )
        for (const key of ['systemWeight', 'peakForce', 'landingPeakForce', 'netImpulse', 'propulsionWork']) {
          const ratio = b.metrics[key].value / a.metrics[key].value
          expect(Math.abs(ratio / factor - 1), key).toBeLessThan(0.012)
        }
        for (const key of sized(a).filter((key) => ['m/s', 'W/kg', 'BW'].includes(catalogue[key].unit))) {
          // The event force of 10 N does not scale.
          const allowed = Math.max(0.02, 0.02 * Math.abs(a.metrics[key].value))
          expect(Math.abs(b.metrics[key].value - a.metrics[key].value), key).toBeLessThan(allowed)
        }
      }),
      runs,
    )
  })

  it('reads half the samples as the same jump', () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        const { recording, options } = drawn(given, seed)
        const a = only(recording, options)
        const half = mapped(recording, (force) => force.filter((_, i) => i % 2 === 0))
        const b = only({ ...half, sampleRateHz: 500 }, options)
        const keys = ['takeoffVelocity', 'jumpHeightImpulse', 'bodyWeight', 'flightTime', 'netImpulse']
        for (const key of keys) {
          const [was, is] = [a.metrics[key], b.metrics[key]]
          const allowed = Math.hypot(was.URepeat ?? 0, is.URepeat ?? 0)
          expect(Math.abs(is.value - was.value), key).toBeLessThan(allowed)
        }
      }),
      runs,
    )
  })

  it('keeps its identities: impulse is momentum, and what goes down comes to rest', () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        const { recording, options } = drawn(given, seed)
        const { metrics, ledger } = only(recording, options)
        const near = (key: string, value: number) => expect(metrics[key].value, key).toBeCloseTo(value, 9)
        near('netImpulse', metrics.takeoffMomentum.value)
        near('propulsionImpulse', metrics.netImpulse.value)
        const mass = metrics.systemWeight.value / options.gravity
        near('landingImpulse', -mass * metrics.landingVelocity.value)
        if (metrics.brakingImpulse) near('brakingImpulse', -metrics.unweightingImpulse.value)
        const gained = ledger?.entries.reduce((sum, { netImpulse }) => sum + netImpulse, 0)
        expect(gained).toBeCloseTo(metrics.closingBalance.value, 6)
      }),
      runs,
    )
  })
})
