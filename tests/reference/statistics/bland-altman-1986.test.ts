import { describe, expect, it } from 'vitest'
import { limitsOfAgreement } from '../../../shared/statistics/agreement/limits-of-agreement.ts'
import { repeatability } from '../../../shared/statistics/agreement/repeatability.ts'
import { isMissing } from '../../../shared/statistics/missing.ts'

// Bland, Altman 1986, Lancet i:307–310, table 1: peak expiratory flow of 17 subjects, l/min, two instruments, twice each.
const wright1 = [494, 395, 516, 434, 476, 557, 413, 442, 650, 433, 417, 656, 267, 478, 178, 423, 427]
const wright2 = [490, 397, 512, 401, 470, 611, 415, 431, 638, 429, 420, 633, 275, 492, 165, 372, 421]
const mini1 = [512, 430, 520, 428, 500, 600, 364, 380, 658, 445, 432, 626, 260, 477, 259, 350, 451]
const mini2 = [525, 415, 508, 444, 500, 625, 460, 390, 642, 432, 420, 605, 227, 467, 268, 370, 443]

const twice = (first: number[], second: number[]) => first.map((value, i) => [value, second[i]])

describe('the example of Bland and Altman 1986', () => {
  const printed = limitsOfAgreement(wright1, mini1, { multiplier: 2 })
  const later = limitsOfAgreement(wright1, mini1)
  if (isMissing(printed) || isMissing(later)) throw new Error('missing')

  it('has the bias −2.1 and the standard deviation 38.8 of the paper', () => {
    expect(printed.bias.value.toFixed(1)).toBe('-2.1')
    expect(printed.sd.toFixed(1)).toBe('38.8')
    expect(printed.bias.value).toBeCloseTo(-2.117647, 6)
    expect(printed.sd).toBeCloseTo(38.76513, 6)
    expect(printed.bias.low).toBeCloseTo(-22.048838, 5)
    expect(printed.bias.high).toBeCloseTo(17.813543, 5)
  })

  it('has the limits that it prints with two standard deviations, from unrounded figures', () => {
    // The paper's −79.7 and 75.5 come from the rounded −2.1 and 38.8.
    expect(printed.lower.value).toBeCloseTo(-79.647907, 5)
    expect(printed.upper.value).toBeCloseTo(75.412613, 5)
    expect(Math.abs(printed.lower.value - -79.7)).toBeLessThan(0.1)
    expect(Math.abs(printed.upper.value - 75.5)).toBeLessThan(0.1)
  })

  it('has its interval of the lower limit, −114.3 to −45.1, and that of the upper', () => {
    expect(printed.lower.low).toBeCloseTo(-114.169742, 4)
    expect(printed.lower.high).toBeCloseTo(-45.126072, 4)
    expect(Math.abs(printed.lower.low - -114.3)).toBeLessThan(0.2)
    expect(Math.abs(printed.lower.high - -45.1)).toBeLessThan(0.1)
    expect(printed.upper.low).toBeCloseTo(40.890777, 4)
    expect(printed.upper.high).toBeCloseTo(109.934447, 4)
  })

  it('has the limits that 1.96 gives since', () => {
    expect(later.lower.value).toBeCloseTo(-78.097302, 5)
    expect(later.upper.value).toBeCloseTo(73.862007, 5)
  })

  it.each([
    ['the large meter', twice(wright1, wright2), 15.306669, 43.293798, 42.427922],
    ['the mini meter', twice(mini1, mini2), 19.910831, 56.316333, 55.190007],
  ])('has the repeatability of %s', (_what, rows, withinSd, withTwo, withNormal) => {
    const [old, since] = [repeatability(rows, 2), repeatability(rows)]
    if (isMissing(old) || isMissing(since)) throw new Error('missing')
    expect(old.withinSd).toBeCloseTo(withinSd, 6)
    expect(old.coefficient).toBeCloseTo(withTwo, 5)
    expect(since.coefficient).toBeCloseTo(withNormal, 5)
  })
})
