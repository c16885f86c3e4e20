/**
 * A number as people type it: blanks round it, a decimal point or a decimal comma. An empty field is null; anything
 * that is no number is NaN, which the contract's schema refuses with a sentence.
 */
export function parseDecimal(typed: unknown): number | null {
  if (typeof typed === 'number' || typed === null) return typed
  const text = String(typed ?? '').trim()
  if (text === '') return null
  return /^[-+]?\d*([.,]\d+)?$/.test(text) ? Number(text.replace(',', '.')) : Number.NaN
}
