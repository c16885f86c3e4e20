import { describe, expect, it } from 'vitest'
import { formatMoney } from './money.ts'

describe('an amount of money', () => {
  it.each([
    [{ amount: 450, currency: 'eur' }, 'en-GB', '€4.50'],
    [{ amount: 450, currency: 'eur' }, 'de-DE', '4,50\u00a0€'],
    [{ amount: 450, currency: 'jpy' }, 'en-GB', 'JP¥450'],
    [{ amount: -1999, currency: 'gbp' }, 'en-GB', '-£19.99'],
    [{ amount: 4500, currency: 'bhd' }, 'en-GB', 'BHD\u00a04.500'],
    [{ amount: 450, currency: 'isk' }, 'en-GB', 'ISK\u00a05'],
  ])('%o is shown in %s as %s', (money, locale, expected) => {
    expect(formatMoney(money, locale)).toBe(expected)
  })
})
