import { z } from 'zod'

/** An amount as the payment service states it: whole minor units (cents) and the currency, ISO 4217 in lower case. */
export const Money = z.strictObject({ amount: z.int(), currency: z.string().length(3) })
export type Money = z.infer<typeof Money>

/**
 * Currencies that the payment service counts in hundredths although they have no minor unit of their own
 * (docs.stripe.com/currencies, special cases).
 */
const countedInHundredths = new Set(['isk', 'ugx'])

/** An amount in words of the locale: 450 eur in en-GB is "€4.50". Nothing is computed but where the point stands. */
export function formatMoney({ amount, currency }: Money, locale?: string): string {
  const format = new Intl.NumberFormat(locale, { style: 'currency', currency })
  const digits = countedInHundredths.has(currency) ? 2 : (format.resolvedOptions().maximumFractionDigits ?? 2)
  return format.format(amount / 10 ** digits)
}
