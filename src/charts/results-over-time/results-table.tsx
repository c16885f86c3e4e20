import type { MetricDefinition } from '../../../shared/mechanics/types.ts'
import { formatDateShort } from '../../lib/format-date.ts'
import { formatUncertainty, formatValue } from '../../lib/format-figure.ts'

export interface DatedMean {
  key: string
  date: string
  value: number
  U: number | null
  trials: number
}

/** The figures of the picture, newest first. */
export function ResultsTable({ means, metric }: { means: readonly DatedMean[]; metric: MetricDefinition }) {
  return (
    <table className="data-table">
      <caption className="sr-only">{metric.name} by date, newest first</caption>
      <thead>
        <tr>
          <th scope="col">Date</th>
          <th scope="col" className="figure">
            {metric.name}, {metric.display.unit}
          </th>
          <th scope="col" className="figure">
            Trials
          </th>
        </tr>
      </thead>
      <tbody>
        {[...means].reverse().map((mean) => (
          <tr key={mean.key}>
            <td>{formatDateShort(mean.date)}</td>
            <td className="figure">
              {formatValue(mean.value, metric.display)}{' '}
              <span className="text-small text-ink-2">{formatUncertainty(mean.U, metric.display)}</span>
            </td>
            <td className="figure">{mean.trials}</td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}
