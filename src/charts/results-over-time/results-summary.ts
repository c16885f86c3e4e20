import type { MetricDefinition } from '../../../shared/mechanics/types.ts'
import { formatDate } from '../../lib/format-date.ts'
import { formatUncertainty, formatValue } from '../../lib/format-figure.ts'

interface DatedMean {
  date: string
  value: number
  U: number | null
}

/** "35.0 ± 0.4 cm" in the metric's display unit. */
export function figureText(
  figure: { value: number; U: number | null },
  { display }: MetricDefinition,
): string {
  const uncertainty = formatUncertainty(figure.U, display)
  return [formatValue(figure.value, display), uncertainty, display.unit].filter(Boolean).join(' ')
}

/** What the picture shows, in a sentence or two; says nothing of whether a change is real. Oldest first. */
export function resultsSummary(means: readonly DatedMean[], metric: MetricDefinition): string {
  const newest = means.at(-1)
  const oldest = means[0]
  if (!newest || !oldest) return `${metric.name}: no results yet.`
  if (means.length === 1)
    return `${metric.name}: one result, ${figureText(newest, metric)} on ${formatDate(newest.date)}.`
  const values = means.map((mean) => mean.value)
  const end = (value: number) => formatValue(value, metric.display)
  return (
    `${metric.name}: ${means.length} results from ${formatDate(oldest.date)} to ${formatDate(newest.date)}, ` +
    `between ${end(Math.min(...values))} and ${end(Math.max(...values))} ${metric.display.unit}. ` +
    `The newest is ${figureText(newest, metric)}.`
  )
}
