import { describe, expect, it } from 'vitest'
import { stirlingError } from './stirling-error.ts'

describe('what Stirling’s formula lacks', () => {
  it.each([
    ['Γ(1) = 1', 1, 1 - Math.log(2 * Math.PI) / 2],
    ['Γ(½) = √π', 0.5, (1 - Math.LN2) / 2],
    ['Γ(11) = 10!', 11, Math.log(3628800) - (10.5 * Math.log(11) - 11 + Math.log(2 * Math.PI) / 2)],
  ])('is what %s asks', (_what, x, expected) => {
    expect(stirlingError(x)).toBeCloseTo(expected, 14)
  })

  it('joins the recurrence to the series without a step', () => {
    const across = stirlingError(10 - 1e-9) / stirlingError(10)
    expect(Math.abs(across - 1)).toBeLessThan(1e-9)
  })

  it('falls as 1/(12x)', () => {
    expect(stirlingError(1e8) * 12e8).toBeCloseTo(1, 12)
  })
})
