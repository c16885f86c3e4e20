import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { analyse } from '../../shared/mechanics/analyse.ts'
import { catalogue, metricKeys, type MetricKey } from '../../shared/mechanics/catalogue.ts'
import type { AnalyseOptions, Recording, TrialAnalysis } from '../../shared/mechanics/types.ts'
import { standardGravity } from '../../shared/units/gravity.ts'
import { sampled, type Sampling } from '../setup/closed-form-cmj.ts'
import { whiteNoise } from '../setup/white-noise.ts'

const options: AnalyseOptions = { gravity: standardGravity, calibrationU: { left: 0.005, right: 0.005 } }

/** A jump on two plates with noise; the same seed gives the same recording. */
function noisyJump(seed: number, sampling: Sampling = {}): Recording {
  const noise = whiteNoise(seed)
  return sampled({ channels: 'feet', shareLeft: 0.47, disturb: (force) => force + 2 * noise(), ...sampling })
}

function only({ trials }: { trials: TrialAnalysis[] }): TrialAnalysis {
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

const seeds = fc.integer({ min: 1, max: 1e6 })
/** A fixed seed: the same trials every time. */
const runs = { numRuns: 12, seed: 4117 }
/** Figures that a change leaves as they are, each to a part of its own size. */
function expectSame(a: TrialAnalysis, b: TrialAnalysis, keys: readonly MetricKey[], relative: number) {
  for (const key of keys) {
    const [was, is] = [a.metrics[key].value, b.metrics[key].value]
    expect(Math.abs(is - was), key).toBeLessThanOrEqual(relative * Math.max(1e-3, Math.abs(was)))
  }
}

/** All figures of the trial but those that are meant to be nothing. */
const sized = metricKeys.filter(
  (key) =>
    catalogue[key].protocols.includes('cmj') &&
    catalogue[key].feet !== 'only' &&
    !['closingBalance', 'feetTakeoffLag', 'feetTouchdownLag'].includes(key),
)

describe('the engine', () => {
  it('gives the same figures when the recording starts later', () => {
    fc.assert(
      fc.property(seeds, fc.integer({ min: 1, max: 700 }), (seed, lead) => {
        const recording = noisyJump(seed)
        const later = mapped(recording, (force) => {
          const longer = new Float64Array(force.length + lead)
          longer.set(force, lead)
          // A quiet beginning with the noise of the stance itself, mirrored.
          for (let i = 0; i < lead; i++) longer[lead - 1 - i] = force[i + 1]
          return longer
        })
        const [a, b] = [only(analyse(recording, options)), only(analyse(later, options))]
        const { weighing } = { weighing: Math.abs(a.metrics.bodyWeight.value - b.metrics.bodyWeight.value) }
        // The weighing may choose another second of the longer stance; it stays within its uncertainty.
        expect(weighing).toBeLessThan(2 * (a.metrics.bodyWeight.URepeat as number))
        for (const name of ['takeoff', 'touchdown', 'landingPeak'] as const) {
          const shift = (b.events[name]?.timeS ?? NaN) - (a.events[name]?.timeS ?? NaN)
          expect(Math.abs(shift - lead / 1000), name).toBeLessThan(1e-9)
        }
      }),
      runs,
    )
  })

  it('scales: with mass and force twice as large, velocities and times stay and forces double', () => {
    fc.assert(
      fc.property(seeds, fc.double({ min: 0.6, max: 1.8, noNaN: true }), (seed, factor) => {
        const a = only(analyse(noisyJump(seed), options))
        const scaled = mapped(noisyJump(seed), (force) => force.map((newton) => factor * newton))
        const b = only(analyse(scaled, options))
        // The event force of 10 N does not scale: velocity at takeoff moves by some mm/s.
        expect(Math.abs(b.metrics.takeoffVelocity.value - a.metrics.takeoffVelocity.value)).toBeLessThan(
          0.012,
        )
        expect(b.metrics.bodyWeight.value / a.metrics.bodyWeight.value).toBeCloseTo(factor, 4)
        expect(b.metrics.landingPeakForce.value / a.metrics.landingPeakForce.value).toBeCloseTo(factor, 4)
        expect(b.metrics.landingPeakForcePerBodyWeight.value).toBeCloseTo(
          a.metrics.landingPeakForcePerBodyWeight.value,
          3,
        )
      }),
      runs,
    )
  })

  it('does not mind which foot is which: sides change places, the rest stays', () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        const recording = noisyJump(seed)
        const { left, right } = recording.channels
        const a = only(analyse(recording, options))
        const b = only(analyse({ ...recording, channels: { left: right, right: left } }, options))
        expectSame(a, b, sized, 1e-9)
        for (const [key, right] of Object.entries(a.sides?.right ?? {}))
          expect(b.sides?.left[key].value, key).toBeCloseTo(right.value, 6)
        for (const [key, asymmetry] of Object.entries(a.sides?.asymmetry ?? {}))
          expect(b.sides?.asymmetry[key].value, key).toBeCloseTo(-asymmetry.value, 9)
        expect(b.metrics.feetTouchdownLag.value).toBeCloseTo(-a.metrics.feetTouchdownLag.value, 12)
      }),
      runs,
    )
  })

  it('takes off a constant offset, whatever plate it is on', () => {
    fc.assert(
      fc.property(seeds, fc.double({ min: -40, max: 40, noNaN: true }), (seed, offset) => {
        const a = only(analyse(noisyJump(seed), options))
        const shifted = mapped(noisyJump(seed), (force) => force.map((newton) => newton + offset))
        const b = only(analyse(shifted, options))
        expectSame(a, b, sized, 1e-6)
      }),
      runs,
    )
  })

  it('adds up: the feet make the total, and left plus right impulse is the total gross impulse', () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        const { metrics, sides, ledger, events } = only(analyse(noisyJump(seed), options))
        const both = (key: string) => (sides?.left[key].value ?? NaN) + (sides?.right[key].value ?? NaN)
        expect(both('stanceForce')).toBeCloseTo(metrics.systemWeight.value, 6)
        const entry = ledger?.entries.find(({ phase }) => phase === 'propulsion')
        const duration = (events.takeoff?.timeS ?? NaN) - (events.zeroVelocity?.timeS ?? NaN)
        const gross = (entry?.netImpulse ?? NaN) + metrics.systemWeight.value * duration
        expect(Math.abs(both('propulsionGrossImpulse') - gross)).toBeLessThan(0.02)
      }),
      runs,
    )
  })

  it('keeps its identities', () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        const { metrics, events, ledger } = only(analyse(noisyJump(seed), options))
        const value = (key: MetricKey) => metrics[key].value
        const mass = value('systemWeight') / standardGravity
        expect(value('netImpulse')).toBeCloseTo(value('takeoffMomentum'), 9)
        expect(value('brakingImpulse')).toBeCloseTo(-value('unweightingImpulse'), 9)
        expect(value('landingImpulse')).toBeCloseTo(-mass * value('landingVelocity'), 9)
        const duration = (events.still?.timeS ?? NaN) - (events.onset?.timeS ?? NaN)
        expect(value('closingBalance')).toBeCloseTo(
          duration * (value('restToRestWeight') - value('systemWeight')),
          6,
        )
        expect(ledger?.closing.value).toBeCloseTo(value('closingBalance'), 12)
        expect(ledger?.entries.at(-1)?.balance).toBeCloseTo(value('closingBalance'), 9)
        const netOf = (phase: string) => ledger?.entries.find((row) => row.phase === phase)?.netImpulse ?? NaN
        expect(netOf('unweighting')).toBeCloseTo(value('unweightingImpulse'), 6)
        expect(netOf('propulsion')).toBeCloseTo(value('propulsionImpulse'), 6)
      }),
      runs,
    )
  })

  it('changes little when every second sample is left out', () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        const a = only(analyse(noisyJump(seed, { sampleRateHz: 2000 }), options))
        const halved = mapped(noisyJump(seed, { sampleRateHz: 2000 }), (force) =>
          force.filter((_, i) => i % 2 === 0),
        )
        const b = only(analyse({ ...halved, sampleRateHz: 1000 }, options))
        for (const key of [
          'takeoffVelocity',
          'jumpHeightImpulse',
          'landingPeakForce',
          'bodyWeight',
        ] as const) {
          const limit = 2 * Math.hypot(a.metrics[key].URepeat as number, b.metrics[key].URepeat as number)
          expect(Math.abs(a.metrics[key].value - b.metrics[key].value), key).toBeLessThan(limit)
        }
      }),
      runs,
    )
  })

  it('never throws and never changes what it was given, whatever that is', () => {
    const sample = fc.oneof(
      fc.double({ min: -3000, max: 6000, noNaN: true }),
      fc.constantFrom(0, 800, NaN, Infinity, -Infinity, 1e300, -1e300, 5e-324),
    )
    fc.assert(
      fc.property(
        fc.array(fc.tuple(sample, fc.integer({ min: 1, max: 400 })), { maxLength: 24 }),
        fc.constantFrom(0, 1, 100, 500, 1000, 48000, NaN),
        fc.boolean(),
        (stretches, sampleRateHz, feet) => {
          const force = Float64Array.from(
            stretches.flatMap(([newton, count]) => Array<number>(count).fill(newton)),
          )
          const before = force.slice()
          const channels = feet ? { left: force, right: force } : { single: force }
          const recording = { sampleRateHz, channels, filledSamples: 0, timeBaseError: 0, notes: [] }
          const result = analyse(recording, options)
          expect(force).toEqual(before)
          for (const trial of result.trials) {
            const figures = Object.values(trial.metrics)
            expect(figures.every(({ value }) => Number.isFinite(value))).toBe(true)
            // Steps of constant force are no jump: nothing may stand there unflagged.
            expect(
              trial.checks.some(({ verdict, affects }) => verdict === 'fail' && affects.includes('jump')),
            ).toBe(true)
          }
          expect(result.trials.length > 0 || result.notes.length > 0).toBe(true)
        },
      ),
      { numRuns: 300, seed: 4117 },
    )
  })

  it('gives the same figures with and without uncertainty', () => {
    const recording = noisyJump(5)
    const [a, b] = [
      only(analyse(recording, options)),
      only(analyse(recording, { ...options, uncertainty: false })),
    ]
    for (const key of Object.keys(a.metrics)) {
      expect(b.metrics[key].value, key).toBeCloseTo(a.metrics[key].value, 9)
      expect(b.metrics[key].U, key).toBeNull()
    }
    expect(b.checks.map(({ key }) => key)).toEqual(a.checks.map(({ key }) => key))
  })

  it('leaves calibration and gravity out of URepeat, and nothing else', () => {
    const recording = noisyJump(9)
    const sure = only(
      analyse(recording, { ...options, calibrationU: { left: 0, right: 0 }, gravityUncertainty: 0 }),
    )
    const usual = only(analyse(recording, options))
    for (const key of [
      'bodyWeight',
      'takeoffVelocity',
      'landingPeakForce',
      'peakPower',
      'landingLoadingRate2080',
    ]) {
      expect(usual.metrics[key].URepeat, key).toBeCloseTo(sure.metrics[key].U as number, 9)
      expect(usual.metrics[key].U as number, key).toBeGreaterThan(usual.metrics[key].URepeat as number)
    }
  })
})
