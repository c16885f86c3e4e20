import { describe, expect, it } from 'vitest'
import { whiteNoise } from '../../../tests/setup/white-noise.ts'
import {
  allowForShortness,
  effectiveSamples,
  estimateNoise,
  integratedNoise,
  weightedNoise,
} from './noise.ts'

const normal = (count: number, seed = 3) => Float64Array.from({ length: count }, whiteNoise(seed))

/** First-order autoregression with the given lag-one correlation and unit variance. */
function coloured(count: number, phi: number, seed = 5): Float64Array {
  const noise = whiteNoise(seed)
  const out = new Float64Array(count)
  out[0] = noise()
  for (let i = 1; i < count; i++) out[i] = phi * out[i - 1] + Math.sqrt(1 - phi * phi) * noise()
  return out
}

describe('estimateNoise', () => {
  it('finds mean and spread of white noise, and nearly every sample independent', () => {
    const noise = estimateNoise(
      normal(4000).map((x) => 800 + 3 * x),
      0,
      4000,
    )
    expect(noise.mean).toBeCloseTo(800, 0)
    expect(Math.abs(noise.sd / 3 - 1)).toBeLessThan(0.04)
    expect(effectiveSamples(noise)).toBeGreaterThan(3000)
  })

  it('finds the inflation (1 + φ)/(1 − φ) of an autoregression', () => {
    const noise = estimateNoise(coloured(40_000, 0.8), 0, 40_000)
    expect(Math.abs(noise.inflation / 9 - 1)).toBeLessThan(0.15)
    expect(noise.correlation[1]).toBeCloseTo(0.8, 1)
  })

  it('gives back what a short correlated stretch hides of its spread, on average', () => {
    let variance = 0
    for (let seed = 1; seed <= 400; seed++)
      variance += allowForShortness(estimateNoise(coloured(200, 0.9, seed), 0, 200)).sd ** 2 / 400
    expect(Math.abs(variance - 1)).toBeLessThan(0.06)
  })

  it('says of nothing, of one sample and of a constant that there is no noise', () => {
    expect(estimateNoise(new Float64Array(0), 0, 0)).toMatchObject({ mean: 0, sd: 0, samples: 0 })
    expect(estimateNoise(Float64Array.of(7), 0, 1)).toMatchObject({ mean: 7, sd: 0, samples: 1 })
    expect(estimateNoise(new Float64Array(50).fill(7), 0, 50)).toMatchObject({ mean: 7, sd: 0, inflation: 1 })
  })

  it('is the same for a shifted and reversed stretch, and scales with its unit', () => {
    const plain = estimateNoise(normal(500), 0, 500)
    const shifted = estimateNoise(
      normal(500).map((x) => x + 1e6),
      0,
      500,
    )
    expect(shifted.sd).toBeCloseTo(plain.sd, 8)
    expect(estimateNoise(normal(500).reverse(), 0, 500).sd).toBeCloseTo(plain.sd, 12)
    expect(
      estimateNoise(
        normal(500).map((x) => 1e8 * x),
        0,
        500,
      ).sd / plain.sd,
    ).toBeCloseTo(1e8, -1)
  })

  it('hands on NaN rather than a number made up', () => {
    expect(estimateNoise(Float64Array.of(1, NaN, 2, 3), 0, 4).mean).toBeNaN()
  })
})

describe('the noise of what is made of samples', () => {
  const white = { mean: 0, sd: 2, correlation: Float64Array.of(1), inflation: 1, samples: 400 }

  it('of a mean of n falls with √n where samples are independent', () => {
    expect(weightedNoise(new Float64Array(16).fill(1 / 16), 16, white)).toBeCloseTo(0.5, 12)
  })

  it('of a mean does not fall where all samples err together', () => {
    const together = { ...white, correlation: new Float64Array(16).fill(1) }
    expect(weightedNoise(new Float64Array(16).fill(1 / 16), 16, together)).toBeCloseTo(2, 12)
  })

  it('of an integral is σ√(TΔt): 2 N white noise at 1 kHz over 0.8 s leave 0.0566 N·s', () => {
    expect(integratedNoise(white, 0.8, 0.001)).toBeCloseTo(0.0565685, 7)
    expect(integratedNoise(white, -1, 0.001)).toBe(0)
  })
})
