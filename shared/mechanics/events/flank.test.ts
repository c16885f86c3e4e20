import { describe, expect, it } from 'vitest'
import { whiteNoise } from '../../../tests/setup/white-noise.ts'
import { defaultSettings } from '../settings.ts'
import { fitFlank } from './flank.ts'

const dt = 0.001
const noiseOf = (sd: number) => ({ mean: 0, sd, correlation: Float64Array.of(1), inflation: 1, samples: 400 })
/** Rise from zero at `foot` (samples) into contact, to either side. */
const rising = (foot: number, shape: (x: number) => number) =>
  Float64Array.from({ length: 200 }, (_, i) => (i > foot ? shape(i - foot) : 0))

const shapes: [name: string, shape: (x: number) => number][] = [
  ['steep and straight', (x) => 52 * x],
  ['gentle, growing with the square', (x) => 1.2 * x * x],
  ['straight with a bend', (x) => 4 * x + 0.9 * x * x],
  ['a raised cosine', (x) => 400 * (1 - Math.cos((Math.PI * Math.min(x, 40)) / 40))],
]

describe('fitFlank', () => {
  it.each(shapes)('places 10 N on a noise-free flank, %s, wherever it lies between samples', (_, shape) => {
    for (const foot of [100, 100.2, 100.5, 100.9]) {
      const force = rising(foot, shape)
      let crossing = foot
      while (shape(crossing - foot) < 10) crossing += 1e-4
      const edge = force.findIndex((newton) => newton >= 10)
      const found = fitFlank(force, edge, 'rising', noiseOf(0), dt, defaultSettings)
      expect(Math.abs((found?.position ?? NaN) - crossing)).toBeLessThan(0.04)
      const mirrored = fitFlank(
        force.slice().reverse(),
        200 - edge,
        'falling',
        noiseOf(0),
        dt,
        defaultSettings,
      )
      expect(mirrored?.position).toBeCloseTo(199 - (found?.position ?? NaN), 6)
      expect(mirrored?.slope).toBeCloseTo(-(found?.slope ?? NaN), 6)
    }
  })

  it.each(shapes)('knows how unsure noise makes it, %s', (_, shape) => {
    const noise = whiteNoise(31)
    const errors: number[] = []
    let u = 0
    for (let k = 0; k < 400; k++) {
      const foot = 100 + (k % 10) / 10
      let crossing = foot
      while (shape(crossing - foot) < 10) crossing += 1e-3
      const force = rising(foot, shape).map((newton) => newton + 3 * noise())
      const edge = force.findIndex((newton, i) => i > 90 && newton >= 15)
      const found = fitFlank(force, edge, 'rising', noiseOf(3), dt, defaultSettings)
      errors.push((found?.position ?? NaN) - crossing)
      u += (found?.positionU ?? NaN) / 400
    }
    const mean = errors.reduce((a, b) => a + b, 0) / 400
    const rms = Math.sqrt(errors.reduce((a, b) => a + b * b, 0) / 400)
    expect(Math.abs(mean)).toBeLessThan(0.2)
    expect(rms / u).toBeGreaterThan(0.5)
    expect(rms / u).toBeLessThan(1.35)
  })

  it('takes a leap between two samples for a crossing anywhere between them', () => {
    const force = Float64Array.from({ length: 200 }, (_, i) => (i >= 100 ? 2000 : 0))
    const found = fitFlank(force, 100, 'rising', noiseOf(1), dt, defaultSettings)
    expect(found?.position).toBe(99.5)
    expect(found?.positionU).toBeCloseTo(0.2887, 4)
  })

  it('is unsure where the plate rings, and says null where the flank leaves the record', () => {
    const ringing = rising(100, (x) => 1.2 * x * x + 40 * Math.sin(1.5 * x) * Math.exp(-x / 10))
    const plain = fitFlank(
      rising(100, (x) => 1.2 * x * x),
      104,
      'rising',
      noiseOf(0.5),
      dt,
      defaultSettings,
    )
    const found = fitFlank(ringing, 101, 'rising', noiseOf(0.5), dt, defaultSettings)
    expect(found?.positionU ?? NaN).toBeGreaterThan(5 * (plain?.positionU ?? NaN))
    expect(Math.abs((found?.position ?? NaN) - 102.9)).toBeLessThan(2 * (found?.positionU ?? NaN))
    expect(
      fitFlank(
        rising(198, (x) => 52 * x),
        199,
        'rising',
        noiseOf(1),
        dt,
        defaultSettings,
      ),
    ).toBeNull()
  })
})
