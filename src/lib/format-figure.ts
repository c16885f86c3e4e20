/** How the catalogue says that a figure is shown. */
export interface FigureDisplay {
  unit: string
  factor: number
  decimals: number
}

/** No-break narrow space between thousands, a true minus sign, never "-0". */
export function formatNumber(value: number, decimals: number): string {
  const rounded = Math.abs(value).toFixed(decimals)
  const [whole = '', fraction] = rounded.split('.')
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, '\u202f')
  const sign = value < 0 && Number(rounded) !== 0 ? '\u2212' : ''
  return sign + grouped + (fraction === undefined ? '' : `.${fraction}`)
}

/** A stored SI value in its display unit, without the unit. */
export function formatValue(value: number, display: FigureDisplay): string {
  return formatNumber(value * display.factor, display.decimals)
}

/**
 * "± 0.4", or null where no uncertainty is known and where there is none: a count is exact. Rounded up at the shown decimals: never smaller than it is, and
 * never "± 0.0".
 */
export function formatUncertainty(U: number | null, display: FigureDisplay): string | null {
  if (U === null || U === 0) return null
  const scale = 10 ** display.decimals
  const shown = Math.max(1, Math.ceil(Math.abs(U * display.factor) * scale - 1e-9)) / scale
  return `±\u00a0${formatNumber(shown, display.decimals)}`
}
