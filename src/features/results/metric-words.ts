import { catalogue, isMetricKey } from '../../../shared/mechanics/catalogue.ts'
import { formatUncertainty, formatValue } from '../../lib/format-figure.ts'

/** A metric's name with its display unit, for the head of a column: "Jump height, cm". */
export function metricHead(metricKey: string): string {
  if (!isMetricKey(metricKey)) return metricKey
  const { name, display } = catalogue[metricKey]
  return display.unit === '' ? name : `${name}, ${display.unit}`
}

/** "34.5 ± 0.6 cm" as plain text. */
export function figureWords(metricKey: string, figure: { value: number; U: number | null }): string {
  if (!isMetricKey(metricKey)) return ''
  const { display } = catalogue[metricKey]
  const parts = [formatValue(figure.value, display), formatUncertainty(figure.U, display), display.unit]
  return parts.filter(Boolean).join(' ')
}
