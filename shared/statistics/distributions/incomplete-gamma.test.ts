import { describe, expect, it } from 'vitest'
import { gammaLogDensity, lowerGamma, upperGamma } from './incomplete-gamma.ts'

describe('the incomplete gamma functions', () => {
  it('begin with nothing below and all above', () => {
    expect(lowerGamma(2, 0)).toBe(0)
    expect(upperGamma(2, 0)).toBe(1)
  })

  it.each([0.001, 0.5, 1.9, 2.1, 9, 40])('have their closed forms at %f', (x) => {
    expect(lowerGamma(1, x)).toBeCloseTo(-Math.expm1(-x), 14)
    expect(upperGamma(2, x) / ((1 + x) * Math.exp(-x))).toBeCloseTo(1, 12)
  })

  it('add up to one', () => {
    for (const shape of [0.1, 3, 500]) {
      for (const x of [shape / 3, shape, 2 * shape])
        expect(lowerGamma(shape, x) + upperGamma(shape, x)).toBeCloseTo(1, 14)
    }
  })

  it('have the density of the logarithm as their slope', () => {
    const at = (u: number) => lowerGamma(3.3, Math.exp(u))
    expect((at(1 + 1e-5) - at(1 - 1e-5)) / 2e-5).toBeCloseTo(gammaLogDensity(3.3, Math.E), 9)
  })
})
