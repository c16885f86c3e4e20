import { lazy, Suspense, useId, useMemo, useState } from 'react'
import type { Trial } from '../../../shared/contracts/trials.ts'
import { useSamples } from '../../api/trials/get-samples.ts'
import type { Samples } from '../../api/trials/read-samples.ts'
import { jumpView } from '../../charts/trial-trace/trace-view.ts'
import { TrialTrace } from '../../charts/trial-trace/trial-trace.tsx'
import { Button } from '../../components/button.tsx'
import { Loading } from '../../components/loading.tsx'
import { QueryState } from '../../components/query-state.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { tracedEvents } from './event-words.ts'
import { useOverlay } from './overlay/use-overlay.ts'
import { traceDataOf } from './trace-data-of.ts'
import { traceSummary } from './trace-summary.ts'
import { TraceTable } from './trace-table.tsx'

/** Fetched when somebody first lays a trial over another. */
const OverlayPanel = lazy(async () => ({
  default: (await import('./overlay/overlay-panel.tsx')).OverlayPanel,
}))

/** Force and momentum of a trial: picture, summary, figures. */
export function TraceSheet({ trial }: { trial: Trial }) {
  const samples = useSamples(trial)
  return (
    <Sheet title="Force and momentum" className="min-w-0">
      <QueryState query={samples} what="the recording">
        {(channels) => <Trace trial={trial} samples={channels} />}
      </QueryState>
    </Sheet>
  )
}

function Trace({ trial, samples }: { trial: Trial; samples: Samples }) {
  const data = useMemo(() => traceDataOf(trial, samples), [trial, samples])
  const overlay = useOverlay(trial)
  const [overlaying, setOverlaying] = useState(false)
  const [feet, setFeet] = useState(true)
  const { overlays } = overlay
  const drawn = useMemo(
    () =>
      data && {
        ...data,
        feet: feet ? data.feet : [],
        overlays,
        events: data.events.filter(
          ({ key, adjusted }) => adjusted || tracedEvents.some((traced) => traced === key),
        ),
      },
    [data, feet, overlays],
  )
  const [whole, setWhole] = useState(false)
  const view = useMemo(
    () => data && (whole ? jumpView([], data.durationS) : jumpView(data.phases, data.durationS)),
    [data, whole],
  )
  const summaryId = useId()
  // Whoever reads their own published trial sees this one alone.
  const athleteId = trial.mayEdit && trial.analysis ? (trial.athlete?.id ?? null) : null
  if (!data || !drawn || !view) return <p>The recording holds no force that could be drawn.</p>
  return (
    <div className="flex flex-col gap-2">
      <TrialTrace data={drawn} view={view} summaryId={summaryId} />
      <p id={summaryId} className="max-w-3xl text-small text-ink-2">
        {traceSummary(trial)}
      </p>
      <div className="flex flex-wrap items-start gap-x-6 text-small">
        {data.feet.length > 0 && (
          <Button look="word" className="no-print" onClick={() => setFeet(!feet)}>
            {feet ? 'Hide left and right' : 'Show left and right'}
          </Button>
        )}
        {athleteId !== null && (
          <Button
            look="word"
            className="no-print"
            aria-expanded={overlaying}
            onClick={() => setOverlaying(!overlaying)}
          >
            Lay other trials over it
          </Button>
        )}
        {data.phases.length > 0 && (
          <Button look="word" className="no-print" aria-pressed={whole} onClick={() => setWhole(!whole)}>
            {whole ? 'Show the jump' : 'Show the whole recording'}
          </Button>
        )}
        <details className="min-w-0 flex-1 py-1">
          <summary className="cursor-pointer">The figures as a table</summary>
          <TraceTable data={data} />
        </details>
      </div>
      {overlaying && athleteId !== null && (
        <Suspense fallback={<Loading what="the other trials" />}>
          <OverlayPanel trial={trial} athleteId={athleteId} overlay={overlay} />
        </Suspense>
      )}
    </div>
  )
}
