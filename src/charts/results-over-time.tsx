import { useId, useMemo, useState, type KeyboardEvent } from 'react'
import type { ResultPoint } from '../../shared/contracts/results.ts'
import { catalogue, type MetricKey } from '../../shared/mechanics/catalogue.ts'
import { formatDate } from '../lib/format-date.ts'
import { ResultsDrawing } from './results-over-time/results-drawing.tsx'
import { resultsGeometry } from './results-over-time/results-geometry.ts'
import { figureText, resultsSummary } from './results-over-time/results-summary.ts'
import { ResultsTable, type DatedMean } from './results-over-time/results-table.tsx'
import { useWidth } from './use-width.ts'

interface Props {
  metricKey: MetricKey
  /** Of one test, oldest first. */
  results: readonly ResultPoint[]
  /** Pixels. */
  height?: number
}

/**
 * One metric's session means over time: a picture, a keyboard way to read it, a text summary and the figures as a
 * table. The bars are how sure each mean is; how much days differ is not in them, and the caption says so.
 */
export function ResultsOverTime({ metricKey, results, height = 190 }: Props) {
  const metric = catalogue[metricKey]
  const means = useMemo(() => meansOf(results, metricKey), [results, metricKey])
  const { ref, width } = useWidth<HTMLDivElement>(340)
  const geometry = useMemo(() => {
    const { factor } = metric.display
    const figures = means.map((mean) => ({
      date: mean.date,
      value: mean.value * factor,
      U: mean.U === null ? null : mean.U * factor,
    }))
    return resultsGeometry(figures, width, height)
  }, [means, metric, width, height])
  const summaryId = useId()
  const reader = usePointReader(means.length)
  const read = reader.read === null ? null : (means[reader.read] ?? null)
  if (means.length === 0) return <p>{resultsSummary(means, metric)}</p>

  return (
    <figure ref={ref}>
      <p id={summaryId} className="sr-only">
        {resultsSummary(means, metric)}
      </p>
      <div
        role="slider"
        tabIndex={0}
        aria-label={`${metric.name}, result by result`}
        aria-describedby={summaryId}
        aria-valuemin={1}
        aria-valuemax={means.length}
        aria-valuenow={(reader.read ?? means.length - 1) + 1}
        aria-valuetext={pointText(read ?? means.at(-1)!, metricKey)}
        onKeyDown={reader.onKeyDown}
      >
        <svg viewBox={`0 0 ${geometry.width} ${geometry.height}`} className="block w-full" aria-hidden="true">
          <ResultsDrawing geometry={geometry} decimals={metric.display.decimals} read={reader.read} />
        </svg>
      </div>
      <figcaption className="text-small text-ink-2">
        {read && <span className="block text-ink">{pointText(read, metricKey)}</span>}
        Each bar is the give or take of that day’s mean. How much one day differs from the next is not in it.
      </figcaption>
      <details className="mt-2 text-small">
        <summary className="cursor-pointer">The figures as a table</summary>
        <ResultsTable means={means} metric={metric} />
      </details>
    </figure>
  )
}

function meansOf(results: readonly ResultPoint[], metricKey: MetricKey): DatedMean[] {
  return results.flatMap((result) => {
    const mean = result.means[metricKey]
    return mean ? [{ key: `${result.sessionId} ${result.trialIds.join()}`, date: result.date, ...mean }] : []
  })
}

const pointText = (mean: DatedMean, metricKey: MetricKey) =>
  `${formatDate(mean.date)}: ${figureText(mean, catalogue[metricKey])}`

/** Which point is being read; the first key press starts at the newest. */
function usePointReader(count: number) {
  const [read, setRead] = useState<number | null>(null)
  const onKeyDown = (event: KeyboardEvent) => {
    const at = read ?? count
    const next = {
      ArrowLeft: at - 1,
      ArrowDown: at - 1,
      ArrowRight: at + 1,
      ArrowUp: at + 1,
      Home: 0,
      End: count - 1,
    }[event.key]
    if (next === undefined) return
    event.preventDefault()
    setRead(Math.min(Math.max(next, 0), count - 1))
  }
  return { read, onKeyDown }
}
