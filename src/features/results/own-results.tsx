import type { ResultPoint } from '../../../shared/contracts/results.ts'
import { testKey } from '../../../shared/contracts/tests.ts'
import { ResultsOverTime } from '../../charts/results-over-time.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { formatDate } from '../../lib/format-date.ts'
import { BigFigure } from './big-figure.tsx'
import { lastYear } from './last-year.ts'
import { OwnLanding } from './own-landing.tsx'
import { PastSessions } from './past-sessions.tsx'

const heightKey = 'jumpHeightImpulse'

/** An athlete's own published results, oldest first: the newest, the year behind it, the landing, every session. */
export function OwnResults({ results, newest }: { results: readonly ResultPoint[]; newest: ResultPoint }) {
  const height = newest.means[heightKey]
  const sameTest = results.filter((result) => testKey(result.test) === testKey(newest.test))
  return (
    <div className="flex max-w-2xl flex-col gap-5">
      <div>
        <p className="pb-2 text-ink-2">Jump test, {formatDate(newest.date)}</p>
        {height ? (
          <BigFigure metricKey={heightKey} figure={height} />
        ) : (
          <p>No jump of this test was sure enough to show a height.</p>
        )}
        {height && <p className="pt-1 text-ink-2">{meanWords(height.trials)}</p>}
      </div>
      <Sheet title="Your last year">
        <ResultsOverTime metricKey={heightKey} results={lastYear(sameTest, newest.date)} />
      </Sheet>
      <OwnLanding newest={newest} />
      <PastSessions results={results} />
    </div>
  )
}

function meanWords(trials: number): string {
  return trials === 1
    ? 'From one jump. The give or take is how sure the plate is of it.'
    : `The average of ${trials} jumps. The give or take is how sure that average is.`
}
