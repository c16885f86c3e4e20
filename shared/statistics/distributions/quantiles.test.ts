import { describe, expect, it } from 'vitest'
import { chiSquaredQuantile } from './chi-squared-quantile.ts'
import { fQuantile, fUpperQuantile } from './f-quantile.ts'
import { incompleteBeta } from './incomplete-beta.ts'
import { lowerGamma } from './incomplete-gamma.ts'
import { normalDeviate, normalQuantile, normalUpperTail } from './normal-quantile.ts'
import { tQuantile } from './t-quantile.ts'

// Against SciPy, a whole grid of them: tests/reference/scipy. Here: closed forms, and how they hang together.
const shares = [1e-12, 1e-5, 0.025, 0.3, 0.5, 0.7, 0.975, 0.99999]
const degrees = [0.5, 1, 2.7, 8, 40, 2598.37, 1e5]

/** Relative difference. */
const off = (a: number, b: number) => Math.abs(a / b - 1)

describe('the quantile of the normal distribution', () => {
  it('is 1.959963984540054 at 0.975 (NIST/SEMATECH e-Handbook 1.3.6.7.1: 1.960)', () => {
    expect(normalQuantile(0.975)).toBeCloseTo(1.959963984540054, 14)
  })

  it('is nothing in the middle and the same on both sides', () => {
    expect(normalQuantile(0.5)).toBe(0)
    for (const p of [0.001, 0.2, 0.4]) expect(normalQuantile(p)).toBeCloseTo(-normalQuantile(1 - p), 13)
  })

  it('undoes the tail, a tiny one too', () => {
    for (const tail of [0.5, 0.1, 1e-3, 1e-20, 1e-200])
      expect(off(normalUpperTail(normalDeviate(tail)), tail)).toBeLessThan(1e-12)
  })
})

describe('the quantile of Student’s t', () => {
  it('has its closed forms at one and two degrees of freedom', () => {
    for (const p of [0.001, 0.3, 0.6, 0.975, 0.9995]) {
      expect(off(tQuantile(p, 1), Math.tan(Math.PI * (p - 0.5)))).toBeLessThan(1e-11)
      const two = (2 * p - 1) / Math.sqrt(2 * p * (1 - p))
      expect(off(tQuantile(p, 2), two)).toBeLessThan(1e-11)
    }
  })

  it('is nothing in the middle and the same on both sides', () => {
    expect(tQuantile(0.5, 7)).toBe(0)
    for (const p of [0.01, 0.3]) expect(tQuantile(p, 7)).toBeCloseTo(-tQuantile(1 - p, 7), 12)
  })

  it('comes to the normal quantile without a step', () => {
    expect(tQuantile(0.975, Infinity)).toBe(normalQuantile(0.975))
    expect(off(tQuantile(0.975, 99_999.999), tQuantile(0.975, 100_000))).toBeLessThan(1e-12)
  })
})

describe('the quantile of χ²', () => {
  it('has its closed form at two degrees of freedom: −2·ln(1 − p)', () => {
    for (const p of shares) expect(off(chiSquaredQuantile(p, 2), -2 * Math.log1p(-p))).toBeLessThan(1e-11)
  })

  it('is the square of a normal deviate at one', () => {
    for (const p of [0.01, 0.5, 0.95])
      expect(off(chiSquaredQuantile(p, 1), normalQuantile((1 + p) / 2) ** 2)).toBeLessThan(1e-12)
  })

  it('undoes the share below it', () => {
    for (const dof of degrees) {
      for (const p of shares)
        expect(off(lowerGamma(dof / 2, chiSquaredQuantile(p, dof) / 2), p)).toBeLessThan(1e-9)
    }
  })
})

describe('the quantile of F', () => {
  it('undoes the share below it', () => {
    for (const between of degrees) {
      for (const within of degrees) {
        for (const p of shares) {
          const odds = (fQuantile(p, between, within) * between) / within
          const share = incompleteBeta(between / 2, within / 2, odds / (1 + odds), 1 / (1 + odds))
          expect(off(share, p)).toBeLessThan(1e-8)
        }
      }
    }
  })

  it('is one over that of the other tail with the degrees of freedom swapped', () => {
    expect(off(fQuantile(0.975, 5, 15) * fQuantile(0.025, 15, 5), 1)).toBeLessThan(1e-12)
    expect(fUpperQuantile(0.025, 5, 15)).toBeCloseTo(fQuantile(0.975, 5, 15), 12)
  })

  it('comes to χ² where one side is known exactly', () => {
    expect(fQuantile(0.9, 4, Infinity)).toBeCloseTo(chiSquaredQuantile(0.9, 4) / 4, 12)
    expect(off(fQuantile(0.9, 4, 1e7), fQuantile(0.9, 4, Infinity))).toBeLessThan(1e-5)
    expect(off(fQuantile(0.9, 1e7, 4), fQuantile(0.9, Infinity, 4))).toBeLessThan(1e-5)
  })
})

describe('every quantile', () => {
  it('grows with the share', () => {
    const quantiles = [
      normalQuantile,
      (p: number) => tQuantile(p, 3),
      (p: number) => chiSquaredQuantile(p, 3),
      (p: number) => fQuantile(p, 3, 5),
    ]
    for (const quantile of quantiles) {
      const values = shares.map((p) => quantile(p))
      expect(values).toEqual([...values].sort((a, b) => a - b))
    }
  })

  it('answers at once for degrees of freedom beyond all sense, with a number or with none', () => {
    for (const dof of [0.1, 1e12, 1e300, Infinity]) {
      const answers = [tQuantile(0.3, dof), chiSquaredQuantile(0.3, dof), fQuantile(0.3, dof, dof)]
      for (const answer of answers) expect(Number.isNaN(answer) || Number.isFinite(answer)).toBe(true)
    }
  })

  it.each([0, 1, -0.1, 1.1, NaN, Infinity])('refuses %d as a probability', (p) => {
    expect(() => normalQuantile(p)).toThrow(RangeError)
    expect(() => tQuantile(p, 3)).toThrow(RangeError)
    expect(() => chiSquaredQuantile(p, 3)).toThrow(RangeError)
    expect(() => fQuantile(p, 3, 3)).toThrow(RangeError)
  })

  it.each([0, 0.09, -1, NaN])('refuses %d degrees of freedom', (dof) => {
    expect(() => tQuantile(0.9, dof)).toThrow(RangeError)
    expect(() => chiSquaredQuantile(0.9, dof)).toThrow(RangeError)
    expect(() => fQuantile(0.9, dof, 3)).toThrow(RangeError)
    expect(() => fQuantile(0.9, 3, dof)).toThrow(RangeError)
  })
})
