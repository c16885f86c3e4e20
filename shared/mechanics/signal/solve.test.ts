import { describe, expect, it } from 'vitest'
import { solveInPlace } from './solve.ts'

describe('solveInPlace', () => {
  it('solves a symmetric positive definite system', () => {
    const b = Float64Array.of(1, 2, 3)
    expect(solveInPlace(Float64Array.of(4, 1, 0, 1, 3, 1, 0, 1, 2), b, 3)).toBe(true)
    const [x, y, z] = b
    expect([4 * x + y, x + 3 * y + z, y + 2 * z].map((v) => Math.round(v * 1e12) / 1e12)).toEqual([1, 2, 3])
  })

  it('refuses a singular system and one with NaN', () => {
    expect(solveInPlace(Float64Array.of(1, 2, 2, 4), Float64Array.of(1, 2), 2)).toBe(false)
    expect(solveInPlace(Float64Array.of(NaN), Float64Array.of(1), 1)).toBe(false)
  })
})
