import { describe, expect, it } from 'vitest'
import { Budget } from '../uncertainty/budget.ts'
import { asymmetryFormulas, type AsymmetryFormula } from '../../statistics/asymmetry/formulas.ts'
import { asymmetryOf } from './asymmetry.ts'

const budget = new Budget(true, 0.95)
const asymmetry = (
  left: number,
  right: number,
  u = 1,
  asymmetryFormula: AsymmetryFormula = 'symmetryIndex',
) => asymmetryOf(budget, budget.input(left, u), budget.input(right, u), false, { asymmetryFormula })

describe('asymmetryOf', () => {
  it.each([
    [900, 1000, 10.526316],
    [480, 520, 8],
    [520, 480, -8],
    [500, 500, 0],
  ])('of %f left and %f right is %f %', (left, right, percent) => {
    expect(asymmetry(left, right)?.value).toBeCloseTo(percent, 6)
  })

  it('names the larger side, and says whether zero lies within the uncertainty', () => {
    expect(asymmetry(480, 520)).toMatchObject({ larger: 'right', zeroWithin: false })
    expect(asymmetry(520, 480)).toMatchObject({ larger: 'left', zeroWithin: false })
    expect(asymmetry(499, 501, 5)).toMatchObject({ larger: 'right', zeroWithin: true })
  })

  it('carries the law of propagation: 400·√(L²u² + R²u²)/(L + R)²', () => {
    const expected = (1.959964 * 400 * Math.hypot(480, 520)) / 1000 ** 2
    expect(asymmetry(480, 520)?.U).toBeCloseTo(expected, 5)
  })

  it.each(Object.keys(asymmetryFormulas) as AsymmetryFormula[])(
    'by %s: the value of the published formula, and an uncertainty that a small change of either side bears out',
    (formula) => {
      const of = asymmetryFormulas[formula]
      const found = asymmetry(480, 520, 1, formula)
      const value = of(480, 520) as number
      expect(found?.value).toBe(value)
      const moved = Math.hypot((of(481, 520) as number) - value, (of(480, 521) as number) - value)
      expect((found?.U as number) / (1.959964 * moved)).toBeCloseTo(1, 2)
    },
  )

  it('is none where both feet carry nothing', () => {
    expect(asymmetry(0, 0)).toBeNull()
    expect(asymmetry(NaN, 1)).toBeNull()
  })
})
