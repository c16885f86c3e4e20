import { catalogue, isMetricKey, type MetricKey } from '../../../shared/mechanics/catalogue.ts'
import { formatUncertainty, formatValue } from '../../lib/format-figure.ts'

/** Where the unit is body weights it says "per body weight" already, and a head is short. */
const saidByUnit = /,? per body weight$/

/** A metric's name with its display unit, for the head of a column: "Jump height, cm", "Landing peak force, BW". */
export function metricHead(metricKey: string): string {
  if (!isMetricKey(metricKey)) return metricKey
  const { name, display } = catalogue[metricKey]
  const short = display.unit.startsWith('BW') ? name.replace(saidByUnit, '') : name
  return display.unit === '' ? short : `${short}, ${display.unit}`
}

/** "34.5 ± 0.6 cm" as plain text. */
export function figureWords(metricKey: string, figure: { value: number; U: number | null }): string {
  if (!isMetricKey(metricKey)) return ''
  const { display } = catalogue[metricKey]
  const parts = [formatValue(figure.value, display), formatUncertainty(figure.U, display), display.unit]
  return parts.filter(Boolean).join(' ')
}

/** Within a sentence: "jump height", and "RSImod" as it is. */
const inSentence = (words: string) => words.replace(/^\p{Lu}(?=\p{Ll})/u, (letter) => letter.toLowerCase())

/** The same of a mean: "Mean jump height, cm"; what is a mean already says so once. */
export function meanHead(metricKey: string): string {
  const head = metricHead(metricKey)
  return head.startsWith('Mean ') ? head : `Mean ${inSentence(head)}`
}

/** A metric within a sentence, beside its figure: "jump height", "RSI", "landing peak force". */
export function metricInSentence(metricKey: MetricKey): string {
  const { name, display } = catalogue[metricKey]
  return inSentence(display.unit.startsWith('BW') ? name.replace(saidByUnit, '') : name)
}

/** "no jump height", where a trial has no such figure. */
export function noFigureWords(metricKey: MetricKey): string {
  return `no ${inSentence(catalogue[metricKey].name)}`
}
