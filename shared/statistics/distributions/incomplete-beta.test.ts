import { describe, expect, it } from 'vitest'
import { betaLogitDensity, incompleteBeta } from './incomplete-beta.ts'

describe('the incomplete beta function', () => {
  it('is nothing at 0 and all at 1', () => {
    expect(incompleteBeta(2, 3, 0, 1)).toBe(0)
    expect(incompleteBeta(2, 3, 1, 0)).toBe(1)
  })

  it.each([0.001, 0.2, 0.5, 0.7, 0.999])('has its closed forms at %f', (x) => {
    const y = 1 - x
    expect(incompleteBeta(1, 1, x, y)).toBeCloseTo(x, 14)
    expect(incompleteBeta(4, 1, x, y)).toBeCloseTo(x ** 4, 14)
    expect(incompleteBeta(1, 4, x, y)).toBeCloseTo(1 - y ** 4, 14)
    expect(incompleteBeta(0.5, 0.5, x, y)).toBeCloseTo((2 / Math.PI) * Math.asin(Math.sqrt(x)), 14)
  })

  it('adds up to one with the two ends swapped', () => {
    for (const x of [0.01, 0.3, 0.9])
      expect(incompleteBeta(3.7, 0.6, x, 1 - x) + incompleteBeta(0.6, 3.7, 1 - x, x)).toBeCloseTo(1, 14)
  })

  it('is a half in the middle of a symmetric variate, large parameters or not', () => {
    for (const a of [0.3, 1, 20, 1e5]) expect(incompleteBeta(a, a, 0.5, 0.5)).toBeCloseTo(0.5, 11)
  })

  it('has the density of the logit as its slope', () => {
    const x = (u: number) => 1 / (1 + Math.exp(-u))
    const at = (u: number) => incompleteBeta(2.5, 7, x(u), x(-u))
    const slope = (at(-1 + 1e-5) - at(-1 - 1e-5)) / 2e-5
    expect(slope).toBeCloseTo(betaLogitDensity(2.5, 7, x(-1), x(1)), 9)
  })
})
