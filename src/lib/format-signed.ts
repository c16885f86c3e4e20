import { formatNumber } from './format-figure.ts'

/** A number that is a change or has a direction: "+233", "−108", and 0 without a sign. */
export function formatSigned(value: number, decimals: number): string {
  const text = formatNumber(value, decimals)
  return value > 0 && Number(value.toFixed(decimals)) !== 0 ? `+${text}` : text
}
