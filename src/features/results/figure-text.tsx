import { catalogue, isMetricKey } from '../../../shared/mechanics/catalogue.ts'
import { formatUncertainty, formatValue } from '../../lib/format-figure.ts'

interface FigureTextProps {
  metricKey: string
  figure: { value: number; U: number | null }
  /** Left out where a table's head bears it. */
  unit?: boolean
  strong?: boolean
}

/** A figure in its display unit, its uncertainty behind it, smaller and quieter. */
export function FigureText({ metricKey, figure, unit = false, strong = false }: FigureTextProps) {
  if (!isMetricKey(metricKey)) return null
  const { display } = catalogue[metricKey]
  const behind = [formatUncertainty(figure.U, display), unit ? display.unit : ''].filter(Boolean).join(' ')
  return (
    <span className="whitespace-nowrap">
      <span className={strong ? 'font-semibold' : undefined}>{formatValue(figure.value, display)}</span>
      {behind !== '' && <span className="text-small text-ink-2"> {behind}</span>}
    </span>
  )
}
