import { catalogue, type MetricKey } from '../../../shared/mechanics/catalogue.ts'
import { formatUncertainty, formatValue } from '../../lib/format-figure.ts'

/** The one number that an athlete came for, named, with its give or take in words. */
export function BigFigure({
  metricKey,
  figure,
}: {
  metricKey: MetricKey
  figure: { value: number; U: number | null }
}) {
  const { name, display } = catalogue[metricKey]
  const sure = formatUncertainty(figure.U, display)
  return (
    <p>
      <span className="block text-ink-2">{name}</span>
      <span className="text-figure font-semibold">{formatValue(figure.value, display)}</span>{' '}
      <span className="text-panel text-ink-2">
        {display.unit}
        {sure !== null && `, give or take ${sure.replace('±\u00a0', '')}`}
      </span>
    </p>
  )
}
