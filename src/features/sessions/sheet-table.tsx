import type { MeanFigure } from '../../../shared/contracts/results.ts'
import { massMetric } from '../../../shared/contracts/sheet-metrics.ts'
import type { MetricKey } from '../../../shared/mechanics/catalogue.ts'
import { MethodLink } from '../../components/method-link.tsx'
import { ScrollRegion } from '../../components/scroll-region.tsx'
import { FigureText } from '../results/figure-text.tsx'
import { meanHead, metricHead } from '../results/metric-words.ts'
import type { SheetRow } from './sheet-rows.ts'
import './sheet-table.css'
import { TrialCell, type CellActs } from './trial-cell.tsx'
import { useSheetCursor, type SheetCursor } from './use-sheet-cursor.ts'

interface Props {
  caption: string
  /** Means beside the mass, the one that stands for the test first. */
  metrics: readonly MetricKey[]
  rows: readonly SheetRow[]
  columns: number
  acts: CellActs
}

/** Athletes down, the means of what is included beside them, then their trials across. */
export function SheetTable({ caption, metrics, rows, columns, acts }: Props) {
  const cursor = useSheetCursor(rows.map((row) => row.trials.length))
  const numbers = Array.from({ length: columns }, (_, i) => i + 1)
  return (
    <ScrollRegion label={caption} className="border-t-2 border-ink bg-sheet">
      <table className="data-table sheet-table">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr>
            <th scope="col">Athlete</th>
            <th scope="col" className="figure">
              <MethodLink noteKey={massMetric}>{metricHead(massMetric)}</MethodLink>
            </th>
            {metrics.map((metric) => (
              <th key={metric} scope="col" className="figure">
                <MethodLink noteKey={metric}>{meanHead(metric)}</MethodLink>
              </th>
            ))}
            {numbers.map((n) => (
              <th key={n} scope="col">
                Trial {n}
              </th>
            ))}
          </tr>
        </thead>
        <tbody onKeyDown={cursor.onKeyDown}>
          {rows.map((row, i) => (
            <AthleteRow
              key={row.athlete.athleteId}
              row={row}
              metrics={metrics}
              index={i}
              columns={columns}
              cursor={cursor}
              acts={acts}
            />
          ))}
        </tbody>
      </table>
    </ScrollRegion>
  )
}

interface RowProps {
  row: SheetRow
  metrics: readonly MetricKey[]
  index: number
  columns: number
  cursor: SheetCursor
  acts: CellActs
}

function AthleteRow({ row: { athlete, trials }, metrics, index, columns, cursor, acts }: RowProps) {
  const empty = columns - trials.length
  return (
    <tr>
      <th scope="row">{athlete.name}</th>
      <MeanCell metricKey={massMetric} mean={athlete.means[massMetric]} plain />
      {metrics.map((metric, i) => (
        <MeanCell key={metric} metricKey={metric} mean={athlete.means[metric]} plain={i > 0} />
      ))}
      {trials.map((trial, i) => (
        <TrialCell
          key={trial.id}
          trial={trial}
          athleteName={athlete.name}
          n={i + 1}
          focus={cursor.cellProps(index, i)}
          acts={acts}
        />
      ))}
      {empty > 0 && (
        <td colSpan={empty} className="text-small text-ink-2">
          {trials.length === 0 ? 'no trial yet' : ''}
        </td>
      )}
    </tr>
  )
}

function MeanCell({
  metricKey,
  mean,
  plain = false,
}: {
  metricKey: string
  mean: MeanFigure | undefined
  plain?: boolean
}) {
  return (
    <td className="figure">{mean && <FigureText metricKey={metricKey} figure={mean} strong={!plain} />}</td>
  )
}
