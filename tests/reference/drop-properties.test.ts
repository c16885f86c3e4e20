import { describe, expect, it } from 'vitest'
import { analyse } from '../../shared/mechanics/analyse.ts'
import type { AnalyseOptions, Recording, Test, TrialAnalysis } from '../../shared/mechanics/types.ts'
import { standardGravity } from '../../shared/units/gravity.ts'
import { sampled, type Sampling } from '../setup/closed-form-dj.ts'
import { whiteNoise } from '../setup/white-noise.ts'

const test: Test = { protocol: 'dj', side: 'both', externalLoadKg: 0, boxHeightM: 0.3, arms: 'hips' }
const options: AnalyseOptions = {
  test,
  gravity: standardGravity,
  calibrationU: { left: 0.005, right: 0.005 },
}
const seeds = [3, 17, 401]

/** A drop jump on two plates with noise; the same seed gives the same recording. */
function noisy(seed: number, sampling: Sampling = {}): Recording {
  const noise = whiteNoise(seed)
  return sampled({ channels: 'feet', shareLeft: 0.47, disturb: (force) => force + 2 * noise(), ...sampling })
}

function trialOf(recording: Recording): TrialAnalysis {
  const { trials } = analyse(recording, options)
  expect(trials).toHaveLength(1)
  return trials[0]
}

function mapped(recording: Recording, change: (force: Float64Array) => Float64Array): Recording {
  const { left, right } = recording.channels
  return {
    ...recording,
    channels: { left: change(left as Float64Array), right: change(right as Float64Array) },
  }
}

const rates = ['dropVelocity', 'takeoffVelocity', 'contactTime', 'flightTime', 'rsi'] as const

describe.each(seeds)('a noisy drop jump (seed %i)', (seed) => {
  const trial = trialOf(noisy(seed))

  it('has the same figures after more empty plates before it', () => {
    const noise = whiteNoise(seed + 1)
    const later = mapped(noisy(seed), (force) => {
      const longer = Float64Array.from({ length: force.length + 400 }, () => 2 * noise())
      longer.set(force, 400)
      return longer
    })
    const moved = trialOf(later)
    // The zero is that of the last second of empty plates, which has some other noise in it.
    for (const key of rates) {
      const limit = 0.1 * (trial.metrics[key].URepeat as number)
      expect(Math.abs(moved.metrics[key].value - trial.metrics[key].value), key).toBeLessThan(limit)
    }
    expect((moved.events.arrival?.timeS ?? NaN) - (trial.events.arrival?.timeS ?? NaN)).toBeCloseTo(0.4, 4)
  })

  it('keeps velocities and times when mass and force grow together', () => {
    const heavier = trialOf(mapped(noisy(seed), (force) => force.map((newton) => 1.5 * newton)))
    expect(heavier.metrics.bodyWeight.value / trial.metrics.bodyWeight.value).toBeCloseTo(1.5, 6)
    // The event force of 10 N does not grow: on 59 kN/s it is reached 0.06 ms sooner.
    expect(Math.abs(heavier.metrics.contactTime.value - trial.metrics.contactTime.value)).toBeLessThan(3e-4)
    expect(Math.abs(heavier.metrics.dropVelocity.value - trial.metrics.dropVelocity.value)).toBeLessThan(
      0.004,
    )
    expect(heavier.metrics.peakForce.value / trial.metrics.peakForce.value).toBeCloseTo(1.5, 6)
  })

  it('does not mind which foot is which', () => {
    const recording = noisy(seed)
    const { left, right } = recording.channels
    const swapped = trialOf({ ...recording, channels: { left: right, right: left } })
    for (const key of rates) expect(swapped.metrics[key].value).toBeCloseTo(trial.metrics[key].value, 9)
    for (const [key, figure] of Object.entries(trial.sides?.asymmetry ?? {}))
      expect(swapped.sides?.asymmetry[key].value, key).toBeCloseTo(-figure.value, 9)
  })

  it('takes off a constant offset', () => {
    const shifted = trialOf(mapped(noisy(seed), (force) => force.map((newton) => newton + 12)))
    for (const key of rates)
      expect(Math.abs(shifted.metrics[key].value - trial.metrics[key].value), key).toBeLessThan(1e-6)
  })

  it('changes within its uncertainty when every second sample is left out', () => {
    const fine = trialOf(noisy(seed, { sampleRateHz: 2000 }))
    const halved = mapped(noisy(seed, { sampleRateHz: 2000 }), (force) => force.filter((_, i) => i % 2 === 0))
    const coarse = trialOf({ ...halved, sampleRateHz: 1000 })
    for (const key of rates) {
      const limit = Math.hypot(fine.metrics[key].URepeat as number, coarse.metrics[key].URepeat as number)
      expect(Math.abs(fine.metrics[key].value - coarse.metrics[key].value), key).toBeLessThan(limit)
    }
  })
})

describe('a trace that is none of these tests', () => {
  const flat = (newton: number, count: number) => new Float64Array(count).fill(newton)
  const traces: Record<string, Float64Array> = {
    zeros: flat(0, 4000),
    'constant force': flat(800, 4000),
    NaN: flat(NaN, 4000),
    'five samples': flat(0, 5),
    'a step up': Float64Array.from([...flat(0, 1000), ...flat(800, 3000)]),
    'steps up and down': Float64Array.from([0, 1, 0, 1, 0, 1].flatMap((on) => [...flat(800 * on, 300)])),
  }
  const protocols = ['dj', 'dropLanding', 'hops'] as const
  it.each(protocols.flatMap((protocol) => Object.keys(traces).map((name) => [protocol, name] as const)))(
    'as %s, of %s: throws nothing, gives finite figures only, and none of the contact unflagged',
    (protocol, name) => {
      const recording: Recording = {
        sampleRateHz: 1000,
        channels: { single: traces[name] },
        filledSamples: 0,
        timeBaseError: 0,
        notes: [],
      }
      const { trials, notes } = analyse(recording, { ...options, test: { ...test, protocol } })
      for (const { metrics, contacts, checks } of trials) {
        for (const { value } of Object.values(metrics)) expect(Number.isFinite(value)).toBe(true)
        for (const { rsi } of contacts ?? []) expect(Number.isFinite(rsi.value)).toBe(true)
        expect(checks.some(({ verdict }) => verdict === 'fail')).toBe(true)
      }
      expect(trials.length + notes.length).toBeGreaterThan(0)
    },
  )
})
