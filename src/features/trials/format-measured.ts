import { formatNumber } from '../../lib/format-figure.ts'

/** A check's figure with as many decimals as its size asks for: three figures that count. */
export function formatMeasured(value: number, unit: string): string {
  const size = Math.abs(value)
  const decimals = Number.isInteger(value) || size >= 100 ? 0 : size >= 10 ? 1 : size >= 1 ? 2 : 3
  return [formatNumber(value, decimals), unit].filter(Boolean).join(' ')
}
