import { describe, expect, it } from 'vitest'
import { sampled } from '../../tests/setup/closed-form-cmj.ts'
import { whiteNoise } from '../../tests/setup/white-noise.ts'
import { standardGravity } from '../units/gravity.ts'
import { analyse } from './analyse.ts'
import { catalogue, isMetricKey } from './catalogue.ts'
import type { AnalyseOptions, ForceChannel, MetricGroup, Recording, TrialAnalysis } from './types.ts'

const options: AnalyseOptions = { gravity: standardGravity, calibrationU: { left: 0.005, right: 0.005 } }
const noise = whiteNoise(71)
const jump = sampled({ channels: 'feet', disturb: (force) => force + noise() })
const left = jump.channels.left as Float64Array
const right = jump.channels.right as Float64Array

function recordingOf(
  channels: Partial<Record<ForceChannel, Float64Array>>,
  rest: Partial<Recording> = {},
): Recording {
  return { ...jump, channels, ...rest }
}

function trialOf(recording: Recording, more: Partial<AnalyseOptions> = {}): TrialAnalysis {
  const { trials } = analyse(recording, { ...options, ...more })
  expect(trials).toHaveLength(1)
  return trials[0]
}

const failed = (trial: TrialAnalysis) =>
  trial.checks.filter(({ verdict }) => verdict === 'fail').map(({ key }) => key)
const check = (trial: TrialAnalysis, key: string) => trial.checks.find((entry) => entry.key === key)
const takenAway = (trial: TrialAnalysis, group: MetricGroup) =>
  trial.checks.some(({ verdict, affects }) => verdict === 'fail' && affects.includes(group))

describe('a good jump', () => {
  const trial = trialOf(jump)

  it('passes every check', () => {
    expect(trial.checks.filter(({ verdict }) => verdict !== 'pass')).toEqual([])
    expect(trial.missing).toEqual([])
  })

  it('has only figures that the catalogue knows, each finite and with uncertainties in order', () => {
    for (const [key, figure] of Object.entries({ ...trial.metrics, ...trial.sides?.left })) {
      expect(isMetricKey(key), key).toBe(true)
      expect(Number.isFinite(figure.value), key).toBe(true)
      if (figure.U !== null) expect(figure.U, key).toBeGreaterThanOrEqual((figure.URepeat as number) - 1e-12)
    }
  })

  it('gives every figure of both feet, and names those without uncertainty', () => {
    const given = Object.keys(trial.metrics)
    const expected = Object.values(catalogue)
      .filter(({ feet, protocols }) => feet !== 'only' && protocols.includes('cmj'))
      .map(({ key }) => key)
    expect([...given].sort()).toEqual([...expected].sort())
    const without = given.filter((key) => trial.metrics[key].U === null)
    expect(trial.notes.filter(({ code }) => code === 'no-uncertainty')).toHaveLength(without.length)
  })

  it('gives each foot what the catalogue promises of feet', () => {
    const expected = Object.values(catalogue)
      .filter(
        ({ feet, key, protocols }) =>
          feet !== undefined && !key.startsWith('feet') && protocols.includes('cmj'),
      )
      .map(({ key }) => key)
    expect(Object.keys(trial.sides?.left ?? {}).sort()).toEqual([...expected].sort())
    expect(Object.keys(trial.sides?.asymmetry ?? {}).sort()).toEqual([...expected].sort())
  })

  it('puts the events in order', () => {
    const {
      onset,
      minimumForce,
      minimumVelocity,
      zeroVelocity,
      takeoff,
      touchdown,
      landingPeak,
      landingZeroVelocity,
      still,
    } = trial.events
    const times = [
      onset,
      minimumForce,
      minimumVelocity,
      zeroVelocity,
      takeoff,
      touchdown,
      landingPeak,
      landingZeroVelocity,
      still,
    ]
    const seconds = times.map((event) => event?.timeS ?? NaN)
    expect(seconds).toEqual([...seconds].sort((a, b) => a - b))
    for (const event of times)
      expect(Math.abs((event?.timeS ?? NaN) * 1000 - (event?.sample ?? NaN))).toBeLessThanOrEqual(0.5)
  })

  it('proposes the test where none is named, and says so', () => {
    expect(analyse(jump, options).notes.map(({ code }) => code)).toContain('test-proposed')
    const named = analyse(jump, { ...options, test: { ...trial.test, arms: 'free' } })
    expect(named.notes).toEqual([])
    expect(named.trials[0].test.arms).toBe('free')
  })

  it('takes an external load off for body weight, and keeps it for system weight', () => {
    const loaded = trialOf(jump, { test: { ...trial.test, externalLoadKg: 20 } })
    expect(loaded.metrics.systemWeight.value).toBe(trial.metrics.systemWeight.value)
    expect(loaded.metrics.bodyMass.value).toBeCloseTo(trial.metrics.bodyMass.value - 20, 9)
    expect(loaded.metrics.takeoffVelocity.value).toBe(trial.metrics.takeoffVelocity.value)
    expect(loaded.metrics.peakForcePerBodyWeight.value).toBeGreaterThan(
      trial.metrics.peakForcePerBodyWeight.value,
    )
  })

  it('leaves everything unaffected by the trial before', () => {
    analyse(sampled({ sampleRateHz: 500 }), options)
    expect(trialOf(jump)).toEqual(trial)
  })

  it('gives one plate no sides', () => {
    for (const channel of ['single', 'total'] as const) {
      const alone = trialOf(recordingOf({ [channel]: left.map((newton, i) => newton + right[i]) }))
      expect(alone.sides).toBeNull()
      expect(alone.metrics.feetTakeoffLag).toBeUndefined()
      expect(alone.metrics.takeoffVelocity.value).toBeCloseTo(trial.metrics.takeoffVelocity.value, 9)
    }
  })

  it('follows an event that a person moved', () => {
    const onset = (trial.events.onset?.timeS ?? NaN) - 0.05
    const moved = trialOf(jump, { movedEvents: { onset } })
    expect(moved.events.onset?.timeS).toBeCloseTo(onset, 9)
    expect(moved.metrics.timeToTakeoff.value - trial.metrics.timeToTakeoff.value).toBeCloseTo(0.05, 6)
    const late = trialOf(jump, { movedEvents: { takeoff: (trial.events.takeoff?.timeS ?? NaN) + 0.01 } })
    expect(late.metrics.takeoffVelocity.value).toBeLessThan(trial.metrics.takeoffVelocity.value - 0.09)
    expect(trialOf(jump, { movedEvents: { onset: NaN } })).toEqual(trial)
  })

  const movable = [
    'minimumForce',
    'minimumVelocity',
    'zeroVelocity',
    'landingPeak',
    'landingZeroVelocity',
  ] as const
  it.each(movable)('takes %s where a person put it', (name) => {
    const timeS = (trial.events[name]?.timeS ?? NaN) - 0.004
    expect(trialOf(jump, { movedEvents: { [name]: timeS } }).events[name]?.timeS).toBeCloseTo(timeS, 9)
  })

  it.each([
    ['minimumForce', 'minimumForce'],
    ['landingPeak', 'landingPeakForce'],
  ] as const)('reads the force where %s was put, less surely on a flank than on the peak', (name, key) => {
    const atPeak = trial.events[name]?.timeS ?? NaN
    const same = trialOf(jump, { movedEvents: { [name]: atPeak } }).metrics[key]
    const aside = trialOf(jump, { movedEvents: { [name]: atPeak - 0.02 } }).metrics[key]
    const { value, U } = trial.metrics[key]
    expect(same.value).toBeCloseTo(value, -1)
    expect(same.U).toBeLessThan(2 * (U as number))
    const sign = name === 'landingPeak' ? 1 : -1
    expect(sign * (value - aside.value)).toBeGreaterThan(5)
    expect(aside.U).toBeGreaterThan(same.U as number)
  })

  it('is as sure of a moved instant as of a sample, whatever the noise', () => {
    const takeoff = Math.round((trial.events.takeoff?.timeS ?? NaN) * jump.sampleRateHz) / jump.sampleRateHz
    const onset = Math.round((trial.events.onset?.timeS ?? NaN) * jump.sampleRateHz) / jump.sampleRateHz
    const { U } = trialOf(jump, { movedEvents: { takeoff, onset } }).metrics.timeToTakeoff
    const sampleS = 1 / jump.sampleRateHz
    expect(U).toBeGreaterThan(0.5 * sampleS)
    expect(U).toBeLessThan(2 * sampleS)
  })
})

describe('a recording without a trial comes back empty, with the reason', () => {
  const flat = (newton: number) => new Float64Array(3000).fill(newton)
  it.each([
    ['too-short', { total: new Float64Array(0) }],
    ['too-short', { total: Float64Array.of(1, 2, 3, 4, 5) }],
    ['no-force-column', {}],
    ['unequal-channels', { left, right: right.slice(3) }],
    ['no-trial-found', { total: flat(800) }],
    ['no-trial-found', { total: flat(0) }],
    ['no-trial-found', { total: flat(NaN) }],
    ['no-trial-found', { total: flat(Infinity) }],
    ['no-trial-found', { total: Float64Array.from(flat(800), (newton) => newton + 3 * noise()) }],
    ['no-trial-found', { total: Float64Array.from(flat(0), () => 500 * noise()) }],
    ['no-trial-found', { total: Float64Array.from(flat(0), (_, i) => (i < 1500 ? noise() : 800 + noise())) }],
    ['no-trial-found', { total: left.map((newton) => newton / 1000) }],
  ])('%s', (code, channels) => {
    const result = analyse(recordingOf(channels), options)
    expect(result.trials).toEqual([])
    expect(result.notes.map((note) => note.code)).toContain(code)
  })

  it('and so does one whose gravity is no number', () => {
    expect(analyse(jump, { ...options, gravity: NaN }).notes[0].code).toBe('gravity-unknown')
  })
})

describe('a flawed recording is kept, and the failed check takes away what it spoils', () => {
  it('several flights without quiet stance between them: everything but the weighing', () => {
    const again = (force: Float64Array) =>
      Float64Array.of(...force.subarray(0, 2700), ...force.subarray(1300))
    const trial = trialOf(recordingOf({ left: again(left), right: again(right) }))
    expect(failed(trial)).toContain('one-takeoff')
    expect(takenAway(trial, 'jump') && takenAway(trial, 'landing')).toBe(true)
    expect(takenAway(trial, 'weighing')).toBe(false)
  })

  it('landing beside the plates: flight and landing, and the takeoff stands', () => {
    const gone = (force: Float64Array) => force.map((newton, i) => (i > 2000 ? noise() : newton))
    const trial = trialOf(recordingOf({ left: gone(left), right: gone(right) }))
    expect(failed(trial)).toContain('landing-on-plates')
    expect(takenAway(trial, 'jump')).toBe(false)
    expect(trial.metrics.landingPeakForce).toBeUndefined()
    expect(trial.missing.map(({ key }) => key)).toContain('landingPeakForce')
    expect(trial.metrics.takeoffVelocity.value).toBeCloseTo(2.528, 2)
    expect(trial.ledger?.closing.closes).toBeNull()
  })

  it('one foot landing beside its plate: the landing, and the takeoff stands', () => {
    const trial = trialOf(
      recordingOf({ left, right: right.map((newton, i) => (i > 2100 ? noise() : newton)) }),
    )
    expect(failed(trial)).toContain('foot-off-landing')
    expect(takenAway(trial, 'jump')).toBe(false)
  })

  it('a dead plate, or a foot beside its plate: everything', () => {
    const { test } = trialOf(jump)
    for (const other of [new Float64Array(left.length), left.map(() => 3 * noise())]) {
      const trial = trialOf(recordingOf({ left, right: other }), { test })
      expect(failed(trial)).toEqual(expect.arrayContaining(['plate-alive', 'both-feet']))
      expect(takenAway(trial, 'weighing')).toBe(true)
      // Where no test is named it may be a jump on one leg; only the naming can tell.
      expect(takenAway(trialOf(recordingOf({ left, right: other })), 'weighing')).toBe(true)
    }
  })

  it('a recording that ends before the fall is stopped: the landing', () => {
    const trial = trialOf(recordingOf({ left: left.slice(0, 2440), right: right.slice(0, 2440) }))
    expect(failed(trial)).toContain('landing-length')
    expect(takenAway(trial, 'jump')).toBe(false)
    expect(trial.missing.map(({ key }) => key)).toContain('landingTime')
  })

  it('no quiet stance before the jump: all that rests on it', () => {
    for (const cut of [990, 1200]) {
      const trial = trialOf(recordingOf({ left: left.slice(cut), right: right.slice(cut) }))
      expect(takenAway(trial, 'jump') && takenAway(trial, 'landing')).toBe(true)
    }
  })

  it('a short stance: a caution, and a sound figure', () => {
    const trial = trialOf(recordingOf({ left: left.slice(350), right: right.slice(350) }))
    expect(check(trial, 'weighing-length')?.verdict).toBe('caution')
    expect(trial.metrics.takeoffVelocity.value).toBeCloseTo(2.528, 2)
  })

  it('a few unreadable samples: a caution; many: everything', () => {
    const few = left.map((newton, i) => (i % 900 === 5 ? NaN : newton))
    expect(check(trialOf(recordingOf({ left: few, right })), 'gaps')?.verdict).toBe('caution')
    const many = left.map((newton, i) => (i > 1500 && i < 1700 ? NaN : newton))
    expect(check(trialOf(recordingOf({ left: many, right })), 'gaps')?.verdict).toBe('fail')
    expect(check(trialOf(recordingOf({ left, right }, { filledSamples: 400 })), 'gaps')?.verdict).toBe('fail')
  })

  it('a force at the ceiling of the plate: what rests on the push and the landing', () => {
    const trial = trialOf(recordingOf({ left: left.map((newton) => Math.min(newton, 1000)), right }))
    expect(failed(trial)).toContain('saturation')
    expect(takenAway(trial, 'jump') && takenAway(trial, 'landing')).toBe(true)
  })

  it('a large offset, much noise, a low rate or an uneven time base: everything', () => {
    const offset = trialOf(recordingOf({ left: left.map((newton) => newton + 300), right }))
    expect(failed(offset)).toEqual(['zero-offset'])
    const noisy = (force: Float64Array) => force.map((newton) => newton + 30 * noise())
    expect(check(trialOf(recordingOf({ left: noisy(left), right: noisy(right) })), 'noise')?.verdict).toBe(
      'fail',
    )
    expect(failed(trialOf(sampled({ sampleRateHz: 100 })))).toContain('sample-rate')
    expect(failed(trialOf(recordingOf({ left, right }, { timeBaseError: 3 })))).toContain('time-base')
  })

  it('a plate that reads negative, or was tared with the athlete on it: put right, with a caution', () => {
    const turned = trialOf(
      recordingOf({ left: left.map((newton) => -newton), right: right.map((newton) => -newton) }),
    )
    expect(check(turned, 'polarity')?.verdict).toBe('caution')
    expect(turned.metrics.takeoffVelocity.value).toBeCloseTo(2.528, 2)
    const tared = trialOf(
      recordingOf({ left: left.map((newton) => newton - 392), right: right.map((newton) => newton - 392) }),
    )
    expect(check(tared, 'zero-offset')?.verdict).toBe('caution')
    expect(tared.metrics.takeoffVelocity.value).toBeCloseTo(2.528, 2)
  })

  it('a mass far from the recorded one: everything, for it may be another athlete', () => {
    expect(check(trialOf(jump, { recordedMassKg: 80.4 }), 'mass-agreement')?.verdict).toBe('pass')
    expect(check(trialOf(jump, { recordedMassKg: 84.5 }), 'mass-agreement')?.verdict).toBe('caution')
    expect(check(trialOf(jump, { recordedMassKg: 60 }), 'mass-agreement')?.verdict).toBe('fail')
    expect(check(trialOf(jump), 'mass-agreement')).toBeUndefined()
  })

  it('a trace that is no jump: all that rests on the jump', () => {
    const bouncing = Float64Array.from({ length: 5000 }, (_, i) =>
      Math.max(0, 800 + 1200 * Math.sin(i / 100)),
    )
    const trial = trialOf(recordingOf({ total: bouncing }))
    expect(takenAway(trial, 'jump') && takenAway(trial, 'push') && takenAway(trial, 'landing')).toBe(true)
    const steppedOff = Float64Array.from({ length: 5000 }, (_, i) => (i < 3000 ? 800 + noise() : noise()))
    expect(takenAway(trialOf(recordingOf({ total: steppedOff })), 'jump')).toBe(true)
  })

  it('says of every check what was found and, where something is wrong, what to do', () => {
    const gone = (force: Float64Array) => force.map((newton, i) => (i > 2000 ? noise() : newton + 80))
    for (const entry of trialOf(recordingOf({ left: gone(left), right })).checks) {
      expect(entry.sentence, entry.key).toMatch(/^[A-Z].*\.$/)
      expect(entry.remedy === '', entry.key).toBe(entry.verdict === 'pass')
      expect(entry.affects.length, entry.key).toBeGreaterThan(0)
    }
  })
})
