import type { ResultPoint } from '../../../shared/contracts/results.ts'
import { testKey } from '../../../shared/contracts/tests.ts'
import { ResultsOverTime } from '../../charts/results-over-time.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { formatDate } from '../../lib/format-date.ts'
import { testWords, trialNouns, trialNounsOfMany } from '../../lib/test-words.ts'
import { BigFigure } from './big-figure.tsx'
import { lastYear } from './last-year.ts'
import { OwnLanding } from './own-landing.tsx'
import { PastSessions } from './past-sessions.tsx'
import { headlineMetric } from './test-metrics.ts'

/**
 * An athlete's own published results, oldest first: the newest by the metric that stands for its test, the year behind
 * it, the landing, every session.
 */
export function OwnResults({ results, newest }: { results: readonly ResultPoint[]; newest: ResultPoint }) {
  const { protocol } = newest.test
  const headline = headlineMetric(protocol)
  const mean = newest.means[headline]
  const sameTest = results.filter((result) => testKey(result.test) === testKey(newest.test))
  return (
    <div className="flex max-w-2xl flex-col gap-5">
      <div>
        <p className="pb-2 text-ink-2">
          {testWords(newest.test)} · {formatDate(newest.date)}
        </p>
        {mean ? (
          <BigFigure metricKey={headline} figure={mean} />
        ) : (
          <p>No {trialNouns[protocol]} of this test was sure enough to show a figure.</p>
        )}
        {mean && <p className="pt-1 text-ink-2">{meanWords(mean.trials, protocol)}</p>}
      </div>
      <Sheet title="Your last year">
        <ResultsOverTime metricKey={headline} results={lastYear(sameTest, newest.date)} />
      </Sheet>
      <OwnLanding newest={newest} />
      <PastSessions results={results} />
    </div>
  )
}

function meanWords(trials: number, protocol: ResultPoint['test']['protocol']): string {
  return trials === 1
    ? `From one ${trialNouns[protocol]}. The give or take is how sure the plate is of it.`
    : `The average of ${trials} ${trialNounsOfMany[protocol]}. The give or take is how sure that average is.`
}
