import { describe, expect, it } from 'vitest'
import { whiteNoise } from '../../../tests/setup/white-noise.ts'
import { defaultSettings } from '../settings.ts'
import { findPeak } from './peak.ts'

const dt = 0.001
const noiseOf = (sd: number) => ({ mean: 0, sd, correlation: Float64Array.of(1), inflation: 1, samples: 400 })
const hump = (widthS: number, height: number) =>
  Float64Array.from(
    { length: 400 },
    (_, i) => height * Math.sin(Math.PI * Math.max(0, Math.min(1, (i - 100.37) * (dt / widthS)))) ** 2,
  )

describe('findPeak', () => {
  it.each([0.03, 0.06, 0.2])('finds height and place of a smooth peak of %f s between samples', (widthS) => {
    const peak = findPeak(hump(widthS, 3000), 90, 390, 1, noiseOf(0), dt, defaultSettings)
    expect(Math.abs(peak.value / 3000 - 1)).toBeLessThan(2e-4)
    expect(peak.position).toBeCloseTo(100.37 + widthS / 2 / dt, 1)
  })

  it('is not lifted by noise as the largest sample is, and knows its own spread', () => {
    const noise = whiteNoise(21)
    const errors: number[] = []
    const largest: number[] = []
    let u = 0
    for (let k = 0; k < 800; k++) {
      const force = hump(0.2, 3000).map((newton) => newton + 4 * noise())
      const peak = findPeak(force, 90, 390, 1, noiseOf(4), dt, defaultSettings)
      errors.push(peak.value - 3000)
      largest.push(Math.max(...force) - 3000)
      u += peak.valueU / 800
    }
    const mean = (values: number[]) => values.reduce((a, b) => a + b, 0) / values.length
    const rms = Math.sqrt(mean(errors.map((e) => e * e)))
    expect(mean(largest)).toBeGreaterThan(3)
    expect(Math.abs(mean(errors))).toBeLessThan(0.5)
    expect(rms / u).toBeGreaterThan(0.7)
    expect(rms / u).toBeLessThan(1.2)
  })

  it('finds the least force the same way', () => {
    const peak = findPeak(
      hump(0.1, 3000).map((newton) => -newton),
      90,
      390,
      -1,
      noiseOf(0),
      dt,
    )
    expect(peak.value).toBeCloseTo(-3000, 0)
  })

  it('reads a force that only rises at the end of the stretch', () => {
    const ramp = Float64Array.from({ length: 100 }, (_, i) => 10 * i)
    expect(findPeak(ramp, 20, 60.5, 1, noiseOf(0), dt, defaultSettings).position).toBeCloseTo(60.5, 6)
    expect(findPeak(ramp, 20, 60.5, 1, noiseOf(0), dt, defaultSettings).value).toBeCloseTo(605, 6)
  })

  it('answers a finite figure for a flat and for a tiny stretch', () => {
    expect(
      findPeak(new Float64Array(50).fill(7), 10, 40, 1, noiseOf(1), dt, defaultSettings).value,
    ).toBeCloseTo(7, 9)
    expect(findPeak(Float64Array.of(1, 2, 1), 0, 2, 1, noiseOf(0), dt, defaultSettings).value).toBeCloseTo(
      2,
      9,
    )
  })
})
