import { ResultsOverTime } from '../../charts/results-over-time.tsx'
import type { ResultPoint } from '../../../shared/contracts/results.ts'
import { catalogue, type MetricKey } from '../../../shared/mechanics/catalogue.ts'
import { CautionLine } from '../../components/caution-line.tsx'
import { SelectField } from '../../components/field.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { Table } from '../../components/table.tsx'
import { counted } from '../../lib/counted.ts'
import { formatSort, parseSort, sortRows } from '../../lib/sort-rows.ts'
import { metricHead } from '../results/metric-words.ts'
import { metricsOf } from '../results/test-metrics.ts'
import { resultColumns } from './result-columns.tsx'

interface ResultsOfTestProps {
  title: string
  /** Of one test, oldest first. */
  results: ResultPoint[]
  metric: MetricKey
  onMetric: (metric: string) => void
  sort: string
  onSort: (sort: string) => void
}

/** An athlete's results in one test: a metric over time, and every session with all its figures. */
export function ResultsOfTest({ title, results, metric, onMetric, sort, onSort }: ResultsOfTestProps) {
  const metrics = metricsOf(results[0]!.test.protocol)
  const columns = resultColumns(metrics)
  return (
    <div className="flex flex-col gap-5">
      <Sheet title={title} titleAside={counted(results.length, 'session')}>
        <SelectField
          label="Metric"
          className="no-print max-w-80 pb-3"
          value={metric}
          onChange={(event) => onMetric(event.target.value)}
        >
          {metrics.map((key) => (
            <option key={key} value={key}>
              {catalogue[key].name}
            </option>
          ))}
        </SelectField>
        <h3 className="font-semibold">{metricHead(metric)}</h3>
        <ResultsOverTime metricKey={metric} results={results} height={240} />
      </Sheet>
      <Sheet title="By session" titleAside="means of the included trials" flush>
        <Table
          caption={`${title}: results by session`}
          columns={columns}
          rows={sortRows(results, columns, parseSort(sort))}
          rowKey={({ sessionId }) => sessionId}
          sort={parseSort(sort)}
          onSort={(next) => onSort(formatSort(next))}
        />
        <div className="px-3 py-2">
          <CautionLine />
        </div>
      </Sheet>
    </div>
  )
}
