import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { isMissing, type Missing } from '../missing.ts'
import { twoWayAnova, type TwoWayAnova } from './two-way-anova.ts'

fc.configureGlobal({ seed: 7 })

function expectFound(result: TwoWayAnova | Missing): TwoWayAnova {
  if (isMissing(result)) throw new Error(`Missing: ${result.missing}`)
  return result
}

const table = fc.tuple(fc.integer({ min: 2, max: 6 }), fc.integer({ min: 2, max: 5 })).chain(([n, k]) =>
  fc.array(fc.array(fc.double({ min: -1e3, max: 1e3, noNaN: true }), { minLength: k, maxLength: k }), {
    minLength: n,
    maxLength: n,
  }),
)

describe('the two-way analysis of variance', () => {
  it.each([
    ['no subject', [], { missing: 'too-few-values', found: 0, needed: 2 }],
    ['one subject', [[1, 2]], { missing: 'too-few-values', found: 1, needed: 2 }],
    ['one trial', [[1], [2]], { missing: 'too-few-values', found: 1, needed: 2 }],
    ['a trial left out', [[1, 2], [3]], { missing: 'unequal-lengths' }],
    [
      'NaN',
      [
        [1, 2],
        [3, NaN],
      ],
      { missing: 'not-finite' },
    ],
    [
      'squares beyond what a number holds',
      [
        [1e200, 2],
        [3, 4],
      ],
      { missing: 'not-finite' },
    ],
  ])('gives a reason for %s', (_what, rows, reason) => {
    expect(twoWayAnova(rows)).toEqual(reason)
  })

  it('tells subjects that differ from trials that do', () => {
    expect(
      twoWayAnova([
        [1, 1],
        [3, 3],
      ]),
    ).toMatchObject({ msBetween: 4, msWithin: 0, msTrials: 0, msResidual: 0 })
    expect(
      twoWayAnova([
        [1, 3],
        [1, 3],
      ]),
    ).toMatchObject({ msBetween: 0, msWithin: 2, msTrials: 4, msResidual: 0 })
    expect(
      twoWayAnova([
        [1, 3],
        [3, 1],
      ]),
    ).toMatchObject({ msBetween: 0, msWithin: 2, msTrials: 0, msResidual: 4 })
  })

  it('splits the whole sum of squares without rest', () => {
    fc.assert(
      fc.property(table, (rows) => {
        const anova = expectFound(twoWayAnova(rows))
        const { subjects: n, trials: k } = anova
        const values = rows.flat()
        const centre = values.reduce((sum, value) => sum + value, 0) / values.length
        const whole = values.reduce((sum, value) => sum + (value - centre) ** 2, 0)
        const parts =
          (n - 1) * anova.msBetween + (k - 1) * anova.msTrials + (n - 1) * (k - 1) * anova.msResidual
        return Math.abs(parts - whole) <= 1e-9 * (1 + whole)
      }),
    )
  })

  it('does not mind the order of subjects or trials, nor a shift', () => {
    fc.assert(
      fc.property(table, fc.double({ min: -1e3, max: 1e3, noNaN: true }), (rows, shift) => {
        const turned = rows.map((row) => row.map((value) => value + shift).reverse()).reverse()
        const [here, there] = [expectFound(twoWayAnova(rows)), expectFound(twoWayAnova(turned))]
        return Object.keys(here).every((key) => {
          const name = key as keyof TwoWayAnova
          return Math.abs(here[name] - there[name]) <= 1e-6 * (1 + here[name])
        })
      }),
    )
  })
})
