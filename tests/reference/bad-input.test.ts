import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { syntheticProtocols } from '../../seed/synthetic/attempts.ts'
import type { GivenAttempt, SyntheticProtocol } from '../../seed/synthetic/attempts.ts'
import { perform } from '../../seed/synthetic/perform.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import { truthOf } from '../../seed/synthetic/truth.ts'
import { analyse } from '../../shared/mechanics/analyse.ts'
import { catalogue, isMetricKey, type MetricKey } from '../../shared/mechanics/catalogue.ts'
import type { AnalyseOptions, ForceChannel, Recording, TrialAnalysis } from '../../shared/mechanics/types.ts'
import { withheldMetrics } from '../../shared/mechanics/withheld.ts'
import { testOf } from './engine-protocols.ts'

const rate = 1000
const noise = { whiteNoiseN: 1.5 }

/** One good trial of a test on two plates, what is known of it, and the truth. */
function good(protocol: SyntheticProtocol) {
  const performance = perform({}, [{ protocol, settleS: 2 } as GivenAttempt])
  const [trial] = performance.trials
  const sampling = { sampleRateHz: rate, durationS: performance.endS }
  const recording = recordJump(performance, sampling, { left: noise, right: noise })
  const options: AnalyseOptions = { test: testOf(trial), gravity: trial.athlete.gravity, calibrationU: {} }
  return { recording, options, truth: truthOf(trial).metrics }
}

const goods = Object.fromEntries(syntheticProtocols.map((protocol) => [protocol, good(protocol)])) as Record<
  SyntheticProtocol,
  ReturnType<typeof good>
>

type Change = (force: Float64Array, channel: string) => Float64Array

function changed({ recording }: ReturnType<typeof good>, change: Change): Recording {
  const channels = Object.entries(recording.channels) as [ForceChannel, Float64Array][]
  return {
    ...recording,
    channels: Object.fromEntries(channels.map(([name, force]) => [name, change(force, name)])),
  }
}

/** Everything that a trial says is a number, an absence with a reason, or nothing. */
function expectSound(trial: TrialAnalysis): void {
  for (const [key, { value, U, k }] of Object.entries(trial.metrics)) {
    expect(isMetricKey(key), key).toBe(true)
    expect(Number.isFinite(value) && (U === null || U >= 0) && k > 0, key).toBe(true)
  }
  for (const { timeS } of Object.values(trial.events)) expect(Number.isFinite(timeS)).toBe(true)
  for (const check of trial.checks) {
    expect(check.sentence, check.key).toMatch(/^[A-Z].*\.$/)
    expect(check.sentence, check.key).not.toMatch(/NaN|Infinity|undefined/)
  }
  for (const { reason } of trial.missing) expect(reason).toMatch(/\.$/)
}

/** Figures that no failed check takes away, and that are further from the truth than a plain error. */
function wrongFigures(trial: TrialAnalysis, truth: Record<string, number>): string[] {
  const withheld = new Set(withheldMetrics(trial))
  return Object.entries(trial.metrics).flatMap(([key, { value, U }]) => {
    const true_ = truth[key]
    if (true_ === undefined || withheld.has(key)) return []
    const allowed = Math.max(4 * (U ?? 0), 0.06 * Math.abs(true_))
    const { unit } = catalogue[key as MetricKey]
    const least = unit === 's' ? 0.01 : unit === 'm' ? 0.02 : 0.05
    return Math.abs(value - true_) > Math.max(allowed, least) ? [`${key} ${value} for ${true_}`] : []
  })
}

const length = (recording: Recording) => Object.values(recording.channels)[0].length

const spoilt: Record<string, Change> = {
  'NaN here and there': (force) => force.map((newton, i) => (i % 701 === 3 ? NaN : newton)),
  'a stretch of NaN': (force) => force.map((newton, i) => (i > 1900 && i < 2300 ? NaN : newton)),
  infinities: (force) =>
    force.map((newton, i) => (i % 977 === 5 ? Infinity : i % 1201 === 7 ? -Infinity : newton)),
  'constant force': (force) => force.map(() => 400),
  zeros: (force) => force.map(() => 0),
  'only NaN': (force) => force.map(() => NaN),
  'negative-going plates': (force) => force.map((newton) => -newton),
  'one negative-going plate': (force, name) => (name === 'left' ? force.map((newton) => -newton) : force),
  'a dead plate': (force, name) => (name === 'left' ? force.map(() => 0) : force),
  'a plate that sticks': (force, name) =>
    name === 'left' ? force.map((newton, i) => (i < 1500 ? newton : force[1500])) : force,
  'a plate that drops out': (force, name) =>
    name === 'left' ? force.map((newton, i) => (i > 1800 && i < 2600 ? 0 : newton)) : force,
  'an offset of 300 N': (force) => force.map((newton) => newton + 300),
  kilonewtons: (force) => force.map((newton) => newton / 1000),
  'a range that ends at 900 N a plate': (force) => force.map((newton) => Math.min(newton, 900)),
  'five samples': (force) => force.slice(0, 5),
  'no samples': (force) => force.slice(0, 0),
  'the first half': (force) => force.slice(0, force.length >> 1),
  'the second half': (force) => force.slice(force.length >> 1),
  backwards: (force) => force.slice().reverse(),
  'every tenth sample': (force) => force.filter((_, i) => i % 10 === 0),
  'strong noise': (force) => force.map((newton, i) => newton + 250 * Math.sin(12.9898 * i * i)),
}

describe.each(syntheticProtocols)('bad input as %s', (protocol) => {
  const { options, truth } = goods[protocol]

  it('is not needed to read a good trial: nothing fails', () => {
    const { trials } = analyse(goods[protocol].recording, options)
    expect(trials).toHaveLength(1)
    expectSound(trials[0])
    expect(trials[0].checks.filter(({ verdict }) => verdict === 'fail')).toEqual([])
    expect(wrongFigures(trials[0], truth)).toEqual([])
  })

  it.each(Object.keys(spoilt))(
    '%s: no exception, no wrong figure that no failed check takes away',
    (name) => {
      const recording = changed(goods[protocol], spoilt[name])
      for (const asked of [options, { ...options, test: undefined }]) {
        const { trials, notes } = analyse(recording, asked)
        for (const trial of trials) {
          expectSound(trial)
          // Backwards it is another movement, of which nothing is known.
          if (trial.test.protocol === protocol && name !== 'backwards')
            expect(wrongFigures(trial, truth)).toEqual([])
        }
        if (trials.length === 0) expect(notes.at(-1)?.sentence).toMatch(/\.$/)
      }
    },
  )

  it('any numbers at all: no exception, and nothing that is no number', () => {
    const samples = fc.array(
      fc.oneof(
        fc.double({ min: -3000, max: 6000, noNaN: false }),
        fc.constantFrom(0, 0, 0, 800, 800, 800, 2000, NaN, Infinity),
      ),
      { minLength: 0, maxLength: 60 },
    )
    fc.assert(
      fc.property(
        samples,
        fc.integer({ min: 1, max: 120 }),
        fc.constantFrom(1, 50, 1000),
        (values, repeat, hz) => {
          const single = Float64Array.from(values.flatMap((value) => Array<number>(repeat).fill(value)))
          const recording = { ...goods[protocol].recording, sampleRateHz: hz, channels: { single } }
          for (const trial of analyse(recording, options).trials) expectSound(trial)
        },
      ),
      { numRuns: 60, seed: 61_211 },
    )
  })
})

it('two million samples are read to their end', { timeout: 60_000 }, () => {
  const { recording, options } = goods.cmj
  const force = recording.channels.left as Float64Array
  const long = Float64Array.from({ length: 2_000_000 }, (_, i) => force[i % force.length])
  const { trials } = analyse(
    { ...recording, channels: { left: long, right: long } },
    { ...options, uncertainty: false },
  )
  expect(trials.length).toBeGreaterThan(200)
  expect(length(recording)).toBeGreaterThan(5000)
})
