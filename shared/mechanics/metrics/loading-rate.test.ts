import { describe, expect, it } from 'vitest'
import { defaultSettings } from '../settings.ts'
import { findPeak } from '../signal/peak.ts'
import { findRise, greatestSlope } from './loading-rate.ts'

const dt = 0.001
const noise = { mean: 0, sd: 0.01, correlation: Float64Array.of(1), inflation: 1, samples: 400 }
const sampled = (f: (tS: number) => number, durationS = 0.15) =>
  Float64Array.from({ length: Math.round(durationS / dt) }, (_, i) => f((i - 10) * dt))
/** Published check: half-sine of 2400 N and 0.1 s. */
const halfSine = sampled((t) => (t > 0 && t < 0.1 ? 2400 * Math.sin((Math.PI * t) / 0.1) : 0))
const peakOf = (force: Float64Array) => findPeak(force, 10, force.length - 1, 1, noise, dt, defaultSettings)

function rate(force: Float64Array): number {
  const peak = peakOf(force)
  const rise = findRise(force, 10, peak, noise, defaultSettings)
  if (!rise) return NaN
  return (0.6 * peak.value) / ((rise.high.position - rise.low.position) * dt)
}

describe('the loading rate between 20 and 80 %', () => {
  it('of a half-sine is the published one', () => {
    expect(Math.abs(rate(halfSine) / 62317.964 - 1)).toBeLessThan(1e-3)
    const rise = findRise(halfSine, 10, peakOf(halfSine), noise, defaultSettings)
    expect(((rise?.low.position ?? NaN) - 10) * dt).toBeCloseTo(0.006409422, 5)
    expect(((rise?.high.position ?? NaN) - 10) * dt).toBeCloseTo(0.029516724, 5)
  })

  it('of a ramp is its slope', () => {
    const ramp = sampled((t) => (t <= 0 ? 0 : t < 0.05 ? 40000 * t : 2000 - 10000 * (t - 0.05)))
    expect(Math.abs(rate(ramp) / 40000 - 1)).toBeLessThan(2e-2)
  })

  it('takes the last upward crossings before the peak, so a first hump does not count', () => {
    const twoHumps = sampled((t) =>
      t <= 0
        ? 0
        : 1400 * Math.exp(-(((t - 0.02) / 0.008) ** 2)) + 2600 * Math.exp(-(((t - 0.075) / 0.02) ** 2)),
    )
    const rise = findRise(twoHumps, 10, peakOf(twoHumps), noise, defaultSettings)
    expect(((rise?.low.position ?? NaN) - 10) * dt).toBeGreaterThan(0.03)
  })

  it('doubts a slope of fewer than eight samples, and one where force turns at a level', () => {
    const steep = sampled((t) =>
      t <= 0 ? 0 : t < 0.01 ? 2400 * Math.sin((Math.PI * t) / 0.02) : 2400 - 8000 * (t - 0.01),
    )
    expect(findRise(steep, 10, peakOf(steep), noise, defaultSettings)?.doubt).toMatch(/Fewer than 8/)
    const turning = sampled((t) =>
      t <= 0
        ? 0
        : 1400 * Math.exp(-(((t - 0.03) / 0.015) ** 2)) + 2600 * Math.exp(-(((t - 0.1) / 0.02) ** 2)),
    )
    const level = { ...noise, sd: 200 }
    expect(findRise(turning, 10, peakOf(turning), level, defaultSettings)?.doubt).toMatch(/turns/)
  })

  it('is null where force does not rise through both levels', () => {
    expect(
      findRise(
        new Float64Array(100).fill(900),
        10,
        { ...peakOf(halfSine), value: 900 },
        noise,
        defaultSettings,
      ),
    ).toBeNull()
  })
})

describe('greatestSlope', () => {
  it('of a half-sine is near πP/T, less what the window rounds off', () => {
    const found = greatestSlope(halfSine, 10, 60, 10)
    expect(Math.abs((found?.slope ?? NaN) / dt / 75398.224 - 1)).toBeLessThan(0.02)
  })

  it('of a straight line is its slope, and null of too few samples', () => {
    const line = Float64Array.from({ length: 60 }, (_, i) => 12 * i)
    expect(greatestSlope(line, 5, 50, 10)?.slope).toBeCloseTo(12, 9)
    expect(greatestSlope(Float64Array.of(1, 2), 0, 1, 10)).toBeNull()
  })
})
