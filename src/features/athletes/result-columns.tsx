import { Link } from 'react-router-dom'
import type { MeanFigure, ResultPoint } from '../../../shared/contracts/results.ts'
import type { MetricKey } from '../../../shared/mechanics/catalogue.ts'
import type { Column } from '../../components/table.tsx'
import { formatDateShort } from '../../lib/format-date.ts'
import { pathOf } from '../../lib/paths.ts'
import { compareNumbers, compareText } from '../../lib/sort-rows.ts'
import { FigureText } from '../results/figure-text.tsx'
import { metricHead } from '../results/metric-words.ts'

/** A session a row: when, which, how many trials, and the mean of each of these metrics. */
export function resultColumns(metrics: readonly MetricKey[]): Column<ResultPoint>[] {
  return [
    {
      key: 'date',
      head: 'Date',
      cell: ({ date, sessionId }) => (
        <Link to={pathOf.session(sessionId)} className="whitespace-nowrap">
          {formatDateShort(date)}
        </Link>
      ),
      compare: (a, b) => compareText(a.date, b.date),
    },
    { key: 'session', head: 'Session', cell: ({ sessionTitle }) => sessionTitle },
    {
      key: 'trials',
      head: 'Trials',
      cell: ({ trialIds }) => trialIds.length,
      compare: (a, b) => a.trialIds.length - b.trialIds.length,
      figure: true,
    },
    ...metrics.map(metricColumn),
  ]
}

function metricColumn(key: MetricKey): Column<ResultPoint> {
  const meanOf = ({ means }: ResultPoint): MeanFigure | undefined => means[key]
  return {
    key,
    head: metricHead(key),
    cell: (point) => {
      const mean = meanOf(point)
      return mean ? <FigureText metricKey={key} figure={mean} /> : <span className="text-ink-2">none</span>
    },
    compare: (a, b) => compareNumbers(meanOf(a)?.value ?? null, meanOf(b)?.value ?? null),
    figure: true,
    emptyFor: (point) => meanOf(point) === undefined,
  }
}
