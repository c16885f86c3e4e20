import { describe, expect, it } from 'vitest'
import { deviance } from './deviance.ts'

describe('the deviance', () => {
  it('is zero where the two agree', () => {
    expect(deviance(1e6, 1e6)).toBe(0)
  })

  it('is no number of what is none', () => {
    expect(deviance(1, NaN)).toBeNaN()
  })

  it('keeps its digits where the two nearly agree: m·(u²/2 − u³/6 + u⁴/12) with u = (x − m)/m', () => {
    for (const u of [1e-6, -1e-6, 1e-9]) {
      const m = 1 / Math.abs(u)
      const series = m * u * u * (1 / 2 - u / 6 + (u * u) / 12)
      expect(deviance(m + Math.sign(u), m) / series).toBeCloseTo(1, 12)
    }
  })

  it('is x·ln(x/m) + m − x on both sides of where it changes its formula', () => {
    for (const x of [0.1, 0.8, 0.83, 1.2, 1.25, 9]) {
      expect(deviance(x, 1)).toBeCloseTo(x * Math.log(x) + 1 - x, 14)
    }
  })
})
