import { describe, expect, it } from 'vitest'
import { isMissing } from '../missing.ts'
import { limitsOfAgreement } from './limits-of-agreement.ts'
import { repeatability } from './repeatability.ts'

// The published example stands in tests/reference.
const first = [10, 12, 15, 11, 18]
const second = [9, 13, 13, 10, 17]

describe('the limits of agreement', () => {
  it('lie a multiple of the SD about the mean difference', () => {
    const found = limitsOfAgreement(first, second, { multiplier: 2 })
    if (isMissing(found)) throw new Error(found.missing)
    expect(found.bias.value).toBeCloseTo(0.8, 12)
    expect(found.sd).toBeCloseTo(Math.sqrt(1.2), 12)
    expect(found.upper.value - found.lower.value).toBeCloseTo(4 * found.sd, 12)
  })

  it('turn over with the methods', () => {
    const [here, there] = [limitsOfAgreement(first, second), limitsOfAgreement(second, first)]
    if (isMissing(here) || isMissing(there)) throw new Error('missing')
    expect(there.bias.value).toBeCloseTo(-here.bias.value, 12)
    expect(there.lower.value).toBeCloseTo(-here.upper.value, 12)
    expect(there.lower.low).toBeCloseTo(-here.upper.high, 12)
  })

  it('fall together where the methods differ by a constant', () => {
    expect(limitsOfAgreement([1, 2, 3], [3, 4, 5])).toMatchObject({
      sd: 0,
      lower: { value: -2 },
      upper: { high: -2 },
    })
  })

  it('have a reason where there are none', () => {
    expect(limitsOfAgreement([], [])).toEqual({ missing: 'too-few-values', found: 0, needed: 2 })
    expect(limitsOfAgreement([1], [1])).toEqual({ missing: 'too-few-values', found: 1, needed: 2 })
    expect(limitsOfAgreement([1, 2], [1])).toEqual({ missing: 'unequal-lengths' })
    expect(limitsOfAgreement([1, NaN], [1, 2])).toEqual({ missing: 'not-finite' })
    expect(limitsOfAgreement([1e308, 1], [-1e308, 1])).toEqual({ missing: 'not-finite' })
  })
})

describe('the repeatability coefficient', () => {
  it('of two trials is multiplier·√2·√(Σd²/2n), a shift counted', () => {
    const rows = first.map((value, i) => [value, second[i]])
    const squares = first.reduce((sum, value, i) => sum + (value - second[i]) ** 2, 0)
    const found = repeatability(rows, 2)
    if (isMissing(found)) throw new Error(found.missing)
    expect(found.withinSd).toBeCloseTo(Math.sqrt(squares / 10), 12)
    expect(found.coefficient).toBeCloseTo(2 * Math.sqrt(squares / 5), 12)
  })

  it('has a reason where there is none', () => {
    expect(repeatability([])).toMatchObject({ missing: 'too-few-values' })
    expect(repeatability([[1, 2]])).toMatchObject({ missing: 'too-few-values' })
    expect(repeatability([[1, 2], [3]])).toEqual({ missing: 'unequal-lengths' })
    expect(
      repeatability([
        [1, 2],
        [Infinity, 2],
      ]),
    ).toEqual({ missing: 'not-finite' })
  })
})
