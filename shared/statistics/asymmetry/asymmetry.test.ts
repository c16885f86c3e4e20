import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { asymmetryFormulas, type AsymmetryFormula } from './formulas.ts'
import { limbSymmetryIndex } from './limb-symmetry-index.ts'
import { percentageDifference } from './percentage-difference.ts'
import { symmetryAngle } from './symmetry-angle.ts'

fc.configureGlobal({ seed: 7 })

const keys = Object.keys(asymmetryFormulas) as AsymmetryFormula[]
const force = fc.double({ min: 1, max: 5000, noNaN: true })

describe('the formulas of asymmetry', () => {
  // Worked by hand and in Python for right 1000, left 900, and right 520, left 480.
  it.each([
    ['symmetryIndex', 10.526316, 8],
    ['bilateralShare', 5.263158, 4],
    ['percentageDifference', 10, 7.692308],
    ['symmetryAngle', 3.347542, 2.545122],
    ['logRatio', 10.536052, 8.004271],
  ] as const)('%s gives its worked values', (key, first, second) => {
    expect(asymmetryFormulas[key](900, 1000)).toBeCloseTo(first, 6)
    expect(asymmetryFormulas[key](480, 520)).toBeCloseTo(second, 6)
  })

  it.each(keys)('%s is above zero where the right side is larger, and turns over with the sides', (key) => {
    const formula = asymmetryFormulas[key]
    fc.assert(
      fc.property(force, force, (left, right) => {
        const here = formula(left, right) ?? NaN
        const there = formula(right, left) ?? NaN
        return Math.sign(here) === Math.sign(right - left) && Math.abs(here + there) < 1e-9
      }),
    )
  })

  it.each(keys)('%s does not mind the unit', (key) => {
    const formula = asymmetryFormulas[key]
    fc.assert(
      fc.property(force, force, fc.double({ min: 1e-3, max: 1e3, noNaN: true }), (left, right, unit) => {
        return Math.abs((formula(left, right) ?? NaN) - (formula(unit * left, unit * right) ?? NaN)) < 1e-9
      }),
    )
  })

  it.each(keys)(
    '%s is zero for equal sides, huge ones too, and absent for none or what is no number',
    (key) => {
      const formula = asymmetryFormulas[key]
      expect(formula(700, 700)).toBeCloseTo(0, 12)
      expect(formula(1e300, 1e300)).toBeCloseTo(0, 12)
      expect(formula(0, 0)).toBeNull()
      expect(formula(NaN, 1)).toBeNull()
      expect(formula(1, Infinity)).toBeNull()
    },
  )

  it.each(keys.filter((key) => key !== 'symmetryAngle'))('%s is absent for a side below zero', (key) => {
    expect(asymmetryFormulas[key](-1, 5)).toBeNull()
    expect(asymmetryFormulas[key](5, -1)).toBeNull()
  })

  it('reach their ends where a side carries nothing', () => {
    expect(asymmetryFormulas.symmetryIndex(0, 5)).toBe(200)
    expect(asymmetryFormulas.bilateralShare(5, 0)).toBe(-100)
    expect(asymmetryFormulas.percentageDifference(0, 5)).toBe(100)
    expect(asymmetryFormulas.symmetryAngle(0, 5)).toBe(50)
    expect(asymmetryFormulas.symmetryAngle(5, 0)).toBe(-50)
    expect(asymmetryFormulas.logRatio(0, 5)).toBeNull()
  })
})

describe('the percentage difference', () => {
  it('to the weaker side is larger: 11.1 where to the stronger it is 10', () => {
    expect(percentageDifference(900, 1000, 'weaker')).toBeCloseTo(11.111111, 6)
    expect(percentageDifference(1000, 900, 'weaker')).toBeCloseTo(-11.111111, 6)
    expect(percentageDifference(0, 5, 'weaker')).toBeNull()
  })
})

describe('the symmetry angle', () => {
  it('stays within ±100 for sides of unlike sign', () => {
    expect(symmetryAngle(-1, 1)).toBeCloseTo(100, 12)
    fc.assert(
      fc.property(
        fc.double({ min: -9, max: 9, noNaN: true }),
        fc.double({ min: -9, max: 9, noNaN: true }),
        (l, r) => {
          const angle = symmetryAngle(l, r)
          return angle === null ? l === 0 && r === 0 : angle >= -100 && angle <= 100
        },
      ),
    )
  })
})

describe('the limb symmetry index', () => {
  it('is the share that the involved side has of the other', () => {
    expect(limbSymmetryIndex(900, 1000)).toBe(90)
    expect(limbSymmetryIndex(480, 520)).toBeCloseTo(92.307692, 6)
    expect(limbSymmetryIndex(0, 5)).toBe(0)
  })

  it('is absent where the other side is zero, or either is no magnitude', () => {
    expect(limbSymmetryIndex(5, 0)).toBeNull()
    expect(limbSymmetryIndex(-5, 5)).toBeNull()
    expect(limbSymmetryIndex(NaN, 5)).toBeNull()
  })
})
