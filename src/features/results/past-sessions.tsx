import { Link } from 'react-router-dom'
import type { ResultPoint } from '../../../shared/contracts/results.ts'
import { Sheet } from '../../components/sheet.tsx'
import { formatDate } from '../../lib/format-date.ts'
import { pathOf } from '../../lib/paths.ts'
import { sentenceCase, testWords, trialNouns } from '../../lib/test-words.ts'
import { FigureText } from './figure-text.tsx'
import { headlineMetric } from './test-metrics.ts'

/** Every published session, newest first, each with its trials to open. */
export function PastSessions({ results }: { results: readonly ResultPoint[] }) {
  return (
    <Sheet title="Your sessions">
      <ul>
        {[...results].reverse().map((result) => (
          <SessionLine key={`${result.sessionId} ${result.trialIds.join()}`} result={result} />
        ))}
      </ul>
    </Sheet>
  )
}

function SessionLine({ result }: { result: ResultPoint }) {
  const { protocol } = result.test
  const headline = headlineMetric(protocol)
  const mean = result.means[headline]
  const date = formatDate(result.date)
  return (
    <li className="border-b border-rule-2 py-2 last:border-b-0">
      <div className="flex items-baseline justify-between gap-4">
        <span className="font-semibold">{date}</span>
        {mean && <FigureText metricKey={headline} figure={mean} unit strong />}
      </div>
      <p className="text-small text-ink-2">
        {result.sessionTitle} · {testWords(result.test)}
      </p>
      <p className="flex flex-wrap gap-x-4">
        {result.trialIds.map((trialId, i) => (
          <Link key={trialId} to={pathOf.trial(trialId)} className="py-1.5">
            {sentenceCase(trialNouns[protocol])} {i + 1} <span className="sr-only">of {date}</span>
          </Link>
        ))}
      </p>
    </li>
  )
}
