import type { ResultPoint } from '../../../shared/contracts/results.ts'
import { testKey } from '../../../shared/contracts/tests.ts'
import type { MetricKey } from '../../../shared/mechanics/catalogue.ts'
import { EmptyState } from '../../components/empty-state.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { testWords } from '../../lib/test-words.ts'
import { useListState } from '../../lib/use-list-state.ts'
import { headlineMetric, metricsOf } from '../results/test-metrics.ts'
import { ResultsOfTest } from './results-of-test.tsx'

/** Without a metric each test shows the one that stands for it. */
const defaults = { metric: '', sort: '-date' }

/** All of an athlete's results, a block for each test: results of different tests are never one line. */
export function AthleteResults({ results }: { results: ResultPoint[] }) {
  const [view, setView] = useListState(defaults)
  if (results.length === 0) {
    return (
      <Sheet flush>
        <EmptyState title="No results yet">
          A result appears here once a session has an analysed trial of this athlete.
        </EmptyState>
      </Sheet>
    )
  }
  const keys = [...new Set(results.map(({ test }) => testKey(test)))]
  const tests = keys.map((key) => [key, results.filter(({ test }) => testKey(test) === key)] as const)
  return (
    <div className="flex flex-col gap-8">
      {tests.map(([key, ofTest]) => (
        <ResultsOfTest
          key={key}
          title={testWords(ofTest[0]!.test)}
          results={ofTest}
          metric={metricOf(view.metric, ofTest[0]!.test)}
          onMetric={(metric) => setView({ metric })}
          sort={view.sort}
          onSort={(sort) => setView({ sort })}
        />
      ))}
    </div>
  )
}

function metricOf(key: string, { protocol }: ResultPoint['test']): MetricKey {
  return metricsOf(protocol).find((metric) => metric === key) ?? headlineMetric(protocol)
}
