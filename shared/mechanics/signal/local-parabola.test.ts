import { describe, expect, it } from 'vitest'
import { whiteNoise } from '../../../tests/setup/white-noise.ts'
import {
  fitParabola,
  parabolaAt,
  parabolaCrossing,
  parabolaNoiseAt,
  parabolaSlopeAt,
  parabolaSlopeNoise,
} from './local-parabola.ts'

const curve = (i: number) => 5 - 0.7 * (i - 31.3) + 0.04 * (i - 31.3) ** 2
const samples = Float64Array.from({ length: 80 }, (_, i) => curve(i))

describe('fitParabola', () => {
  it.each([1, 2, 5, 20])('goes through a parabola exactly, whatever the half-width (%i)', (half) => {
    const fit = fitParabola(samples, 30, half)
    expect(parabolaAt(fit, 31.3)).toBeCloseTo(5, 9)
    expect(parabolaSlopeAt(fit, 31.3)).toBeCloseTo(-0.7, 9)
    expect(fit.bend).toBeCloseTo(0.04, 9)
  })

  it('is a mirror image for reversed samples and moves with an offset', () => {
    const fit = fitParabola(samples.slice().reverse(), 79 - 30, 5)
    expect(parabolaSlopeAt(fit, 79 - 31.3)).toBeCloseTo(0.7, 9)
    expect(
      parabolaAt(
        fitParabola(
          samples.map((y) => y + 1e6),
          30,
          5,
        ),
        31.3,
      ),
    ).toBeCloseTo(1e6 + 5, 6)
  })

  it('stays inside the record at its ends, and hands on NaN', () => {
    expect(fitParabola(samples, 0, 10).centre).toBe(10)
    expect(fitParabola(samples, 500, 10).centre).toBe(69)
    expect(fitParabola(Float64Array.of(1, NaN, 3), 1, 1).level).toBeNaN()
  })

  it('finds the crossing nearest to where it is sought, and none out of reach', () => {
    const fit = fitParabola(samples, 31, 5)
    const crossing = parabolaCrossing(fit, 4, 32, 10)
    expect(curve(crossing ?? NaN)).toBeCloseTo(4, 9)
    expect(parabolaCrossing(fit, -100, 32, 10)).toBeNull()
    expect(parabolaCrossing(fit, 4, 0, 5)).toBeNull()
  })

  it('crosses a straight line too', () => {
    const line = Float64Array.from({ length: 21 }, (_, i) => 3 * i)
    expect(parabolaCrossing(fitParabola(line, 10, 4), 31.5, 10, 5)).toBeCloseTo(10.5, 9)
  })

  it('knows how far noise moves its value and slope', () => {
    const white = { mean: 0, sd: 1, correlation: Float64Array.of(1), inflation: 1, samples: 1000 }
    const fit = fitParabola(samples, 30, 6)
    const [level, slope]: number[][] = [[], []]
    const noise = whiteNoise(11)
    for (let k = 0; k < 4000; k++) {
      const noisy = fitParabola(
        samples.map((y) => y + noise()),
        30,
        6,
      )
      level.push(parabolaAt(noisy, 31.3) - 5)
      slope.push(noisy.slope - fit.slope)
    }
    const rms = (errors: number[]) => Math.sqrt(errors.reduce((sum, e) => sum + e * e, 0) / errors.length)
    expect(Math.abs(rms(level) / parabolaNoiseAt(fit, 31.3, white) - 1)).toBeLessThan(0.05)
    expect(Math.abs(rms(slope) / parabolaSlopeNoise(fit, white) - 1)).toBeLessThan(0.05)
  })
})
