import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { GivenAttempt } from '../../seed/synthetic/attempts.ts'
import { perform } from '../../seed/synthetic/perform.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import { analyse } from '../../shared/mechanics/analyse.ts'
import { cutRecording } from '../../shared/mechanics/trials/cut-recording.ts'
import type { AnalyseOptions, Recording, TrialAnalysis } from '../../shared/mechanics/types.ts'
import { standardGravity } from '../../shared/units/gravity.ts'
import { testOf } from './engine-protocols.ts'

const known: AnalyseOptions = { gravity: standardGravity, calibrationU: { left: 0.005, right: 0.005 } }
/** A fixed seed: the same trials every time. */
const runs = { numRuns: 12, seed: 8263 }
const rate = 1000

interface Drawn {
  recording: Recording
  options: AnalyseOptions
  /** Quiet, or off the plates, between the first trial and the second, s. */
  between: { fromS: number; toS: number }
}

/** Two attempts one after the other, with noise, the athlete on the plates between them or off. */
function drawn(first: GivenAttempt, second: GivenAttempt, leavesForS: number | null, seed: number): Drawn {
  const performance = perform({}, [{ ...first, leavesForS }, second], seed)
  const [a, b] = performance.trials
  const noise = { whiteNoiseN: 2 }
  const recording = recordJump(
    performance,
    { sampleRateHz: rate, durationS: performance.endS },
    { left: noise, right: noise },
    seed,
  )
  // On the plates there must be enough stance on both sides of the cut to find stillness and to weigh.
  const between =
    leavesForS === null
      ? { fromS: a.marks.restS + 1.2, toS: b.marks.fromS + 0.5 }
      : { fromS: a.stepOffS ?? a.marks.restS, toS: b.marks.fromS }
  return { recording, options: { ...known, test: testOf(b) }, between }
}

const attempts = fc.constantFrom<GivenAttempt>(
  { protocol: 'cmj', settleS: 2 },
  { protocol: 'cmj', settleS: 2, takeoffVelocity: 2.1, depthM: 0.24 },
  { protocol: 'sj', settleS: 2, stanceS: 2.2 },
  { protocol: 'slcmj', settleS: 2 },
)

function lengthOf({ channels }: Recording): number {
  return Object.values(channels)[0].length
}

/** The figures agree to a small part of their uncertainty: another piece of quiet stance may be weighed. */
function expectAlike(a: TrialAnalysis, b: TrialAnalysis, shiftS: number): void {
  expect(Object.keys(a.metrics).sort()).toEqual(Object.keys(b.metrics).sort())
  for (const [key, { value, URepeat }] of Object.entries(a.metrics)) {
    const other = b.metrics[key].value
    const allowed = Math.max(1.2 * (URepeat ?? 0), 0.02 * Math.abs(value), 1e-9)
    expect(Math.abs(other - value), key).toBeLessThanOrEqual(allowed)
  }
  for (const name of ['takeoff', 'touchdown', 'landingPeak'] as const)
    expect((b.events[name]?.timeS ?? NaN) + shiftS, name).toBeCloseTo(a.events[name]?.timeS ?? NaN, 3)
}

describe('a recording of two trials', () => {
  it('gives the two analyses that it gives when it is cut between them', () => {
    const cutAt = fc.double({ min: 0.3, max: 0.7, noNaN: true })
    const leaves = fc.constantFrom(null, 2.5, 4)
    fc.assert(
      fc.property(attempts, leaves, cutAt, fc.integer({ min: 1, max: 1e6 }), (attempt, off, share, seed) => {
        const { recording, options, between } = drawn(attempt, attempt, off, seed)
        const cut = Math.round((between.fromS + share * (between.toS - between.fromS)) * rate)
        const whole = analyse(recording, options)
        expect(whole.trials).toHaveLength(2)
        const parts = [
          cutRecording(recording, { from: 0, to: cut }),
          cutRecording(recording, { from: cut, to: lengthOf(recording) }),
        ]
        for (const [i, part] of parts.entries()) {
          const { trials } = analyse(part, options)
          expect(trials).toHaveLength(1)
          expectAlike(whole.trials[i], trials[0], i === 0 ? 0 : cut / rate)
        }
      }),
      runs,
    )
  })

  it('gives each trial the very figures that its own samples give alone', () => {
    fc.assert(
      fc.property(
        attempts,
        attempts,
        fc.constantFrom(null, 3),
        fc.integer({ min: 1, max: 1e6 }),
        (a, b, off, seed) => {
          const { recording, options } = drawn(a, { ...b, protocol: a.protocol } as GivenAttempt, off, seed)
          for (const trial of analyse(recording, options).trials) {
            const from = Math.round(trial.startS * rate)
            const part = cutRecording(recording, { from, to: Math.round(trial.endS * rate) + 1 })
            const [alone, ...others] = analyse(part, options).trials
            expect(others).toEqual([])
            expect(alone.metrics).toEqual(trial.metrics)
            expect(alone.sides).toEqual(trial.sides)
            expect(alone.checks).toEqual(trial.checks)
            expect(alone.ledger?.closing).toEqual(trial.ledger?.closing)
          }
        },
      ),
      runs,
    )
  })

  it('is told apart by test where none is named', () => {
    const named = (...given: GivenAttempt[]) => {
      const performance = perform({}, given)
      const noise = { whiteNoiseN: 1 }
      const sampling = { durationS: performance.endS }
      const recording = recordJump(performance, sampling, { left: noise, right: noise })
      return analyse(recording, known).trials.map(({ test }) => [test.protocol, test.side])
    }
    expect(named({ protocol: 'cmj', settleS: 2 }, { protocol: 'sj', stanceS: 2 })).toEqual([
      ['cmj', 'both'],
      ['sj', 'both'],
    ])
    expect(named({ protocol: 'slcmj', side: 'right', leavesForS: 2 }, { protocol: 'sj' })).toEqual([
      ['slcmj', 'right'],
      ['sj', 'both'],
    ])
  })
})

describe('what is no trial beside one that is', () => {
  it('a walk over the plates makes none', () => {
    const performance = perform({}, [{ protocol: 'cmj' }])
    const jump = recordJump(performance, { durationS: performance.endS, plates: 1 })
    const force = jump.channels.single as Float64Array
    const walk = Float64Array.from({ length: 5000 }, (_, i) =>
      i > 1500 && i < 2200 ? 820 * Math.sin((Math.PI * (i - 1500)) / 700) : 0,
    )
    const recording = { ...jump, channels: { single: Float64Array.of(...walk, ...force) } }
    const { trials } = analyse(recording, known)
    expect(trials).toHaveLength(1)
    expect(trials[0].checks.filter(({ verdict }) => verdict === 'fail')).toEqual([])
  })

  it('a jump that came down beside the plates is kept, and says so', () => {
    const performance = perform({}, [{ protocol: 'cmj', leavesForS: 3 }, { protocol: 'cmj' }])
    const recording = recordJump(performance, { durationS: performance.endS, plates: 1 })
    const [a, b] = performance.trials
    const touchdown = (a.marks.flights[0]?.toS ?? NaN) * rate
    const back = b.marks.fromS * rate
    const beside = (recording.channels.single as Float64Array).map((newton, i) =>
      i >= touchdown && i < back ? 0 : newton,
    )
    const { trials } = analyse({ ...recording, channels: { single: beside } }, known)
    expect(trials).toHaveLength(2)
    const failed = trials[0].checks.filter(({ verdict }) => verdict === 'fail').map(({ key }) => key)
    expect(failed).toEqual(['landing-on-plates'])
  })
})
