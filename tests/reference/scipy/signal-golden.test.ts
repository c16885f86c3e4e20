import { describe, expect, it } from 'vitest'
import { findRise } from '../../../shared/mechanics/metrics/loading-rate.ts'
import { defaultSettings } from '../../../shared/mechanics/settings.ts'
import { lowPass, zeroLagLowPass, type Section } from '../../../shared/mechanics/signal/butterworth.ts'
import { grossImpulse } from '../../../shared/mechanics/signal/gross-impulse.ts'
import { integrate } from '../../../shared/mechanics/signal/motion.ts'
import type { Noise } from '../../../shared/mechanics/signal/noise.ts'
import { findPeak } from '../../../shared/mechanics/signal/peak.ts'
import { runningSums } from '../../../shared/mechanics/signal/running-mean.ts'
import golden from './golden.json' with { type: 'json' }
import { expectClose } from './expect-close.ts'

const scipy = `SciPy ${golden.madeWith.scipy}`

describe(`the trapezoid rule against ${scipy}`, () => {
  const { sampleRateHz, weight, gravity, velocity, impulses } = golden.trapezoid
  const force = Float64Array.from(golden.trapezoid.force)

  it('gives velocity at every sample', () => {
    const motion = integrate(force, 0, weight, gravity, 1 / sampleRateHz)
    expectClose(motion.velocity, velocity, { relative: 1e-11, absolute: 1e-12 })
  })

  it.each(impulses)('gives the impulse from sample $from to $to', ({ from, to, impulse }) => {
    const found = grossImpulse(force, runningSums(force, 'golden'), from, to, 1 / sampleRateHz)
    expectClose([found], [impulse], { relative: 1e-11, absolute: 1e-11 })
  })
})

/** A section as b and a, the way that filters are printed. */
const coefficients = ({ b0, b1, b2, a1, a2 }: Section) => [b0, b1, b2, 1, a1, a2]

describe(`the second-order Butterworth low-pass against ${scipy}`, () => {
  it.each(golden.butterworth)('corrected for two passes, $cutoffHz Hz at $sampleRateHz Hz', (design) => {
    const found = coefficients(lowPass(design.cutoffHz, design.sampleRateHz))
    expectClose(found, [...design.twoPasses.b, ...design.twoPasses.a], { relative: 1e-11, absolute: 1e-13 })
    expect(design.gainOfTwoPasses).toBeCloseTo(Math.SQRT1_2, 12)
  })

  it.each(golden.butterworth)(
    'of one pass, $cutoffHz Hz at $sampleRateHz Hz',
    ({ cutoffHz, sampleRateHz, onePass }) => {
      // The engine's design always corrects for two passes: asked for the cut-off that the correction moves to this one.
      const correction = (Math.SQRT2 - 1) ** 0.25
      const asked =
        Math.atan(correction * Math.tan((Math.PI * cutoffHz) / sampleRateHz)) * (sampleRateHz / Math.PI)
      const found = coefficients(lowPass(asked, sampleRateHz))
      expectClose(found, [...onePass.b, ...onePass.a], { relative: 1e-11, absolute: 1e-13 })
    },
  )
})

describe(`zero-lag filtering against ${scipy}: filtfilt, padded by odd reflection`, () => {
  it.each(golden.zeroLag)('$cutoffHz Hz over samples $from to $to', (example) => {
    const force = Float64Array.from(example.force)
    const section = lowPass(example.cutoffHz, example.sampleRateHz)
    const found = zeroLagLowPass(force, example.from, example.to, section)
    expectClose(found, example.filtered, { relative: 1e-10, absolute: 1e-9 })
    expect([...force]).toEqual(example.force)
  })
})

const noNoise: Noise = { mean: 0, sd: 0, correlation: Float64Array.of(1), inflation: 1, samples: 100 }

/** SciPy joins samples by straight lines, the engine by parabolas: on the ramp both are exact, on curves they differ. */
const withinSamples: Record<string, number> = { ramp: 1e-9, 'half sine': 0.01, 'two peaks': 0.02 }

describe(`crossings on the way up to a peak against ${scipy}: peak_widths`, () => {
  it.each(golden.peakCrossings)(
    '$name, $share of the peak',
    ({ name, force: samples, sampleRateHz, share, position }) => {
      const force = Float64Array.from(samples)
      const peak = findPeak(force, 0, force.length - 1, 1, noNoise, 1 / sampleRateHz)
      const rise = findRise(force, 15, peak, noNoise, defaultSettings)
      const crossing = share === defaultSettings.loadingRateLow ? rise?.low : rise?.high
      expect(Math.abs((crossing?.position ?? NaN) - position)).toBeLessThan(withinSamples[name])
    },
  )
})
