import { useId, useMemo } from 'react'
import type { MetricKey } from '../../../shared/mechanics/catalogue.ts'
import type { EventName, Phase } from '../../../shared/mechanics/types.ts'
import { TrialTrace } from '../../charts/trial-trace/trial-trace.tsx'
import { formatNumber } from '../../lib/format-figure.ts'
import { traceDataOf } from '../trials/trace-data-of.ts'
import { TraceTable } from '../trials/trace-table.tsx'
import { traceOfNote } from './trace-of-note.ts'
import { weighedWindow } from './weighed-window.ts'
import type { WorkedExample } from './worked-example.ts'

interface Props {
  example: WorkedExample
  metricKey: MetricKey
  /** Where the figure is read, in a sentence. */
  read: string
  events: readonly EventName[]
  phase: Phase | null
}

/** Where on the sample's trace a figure is read: picture, sentence, figures. */
export function ExampleTrace({ example, metricKey, read, events, phase }: Props) {
  const whole = useMemo(() => traceDataOf(example, example.samples), [example])
  const span = useMemo(() => weighedWindow(example, metricKey), [example, metricKey])
  const shown = useMemo(
    () => whole && traceOfNote(whole, { events, phase, span }),
    [whole, events, phase, span],
  )
  const summaryId = useId()
  if (!whole || !shown) return null
  const instants = span
    ? [`weighed from ${formatNumber(span.startS, 3)} to ${formatNumber(span.endS, 3)} s`]
    : shown.data.events.map(({ label, timeS }) => `${label} at ${formatNumber(timeS, 3)} s`)
  return (
    <div className="flex min-w-0 flex-col gap-2">
      <TrialTrace data={shown.data} view={shown.view} summaryId={summaryId} />
      <p id={summaryId} className="max-w-3xl text-small text-ink-2">
        {read} In the sample: {instants.join(', ')}.
      </p>
      <details className="text-small">
        <summary className="cursor-pointer">The trace at every event, as a table</summary>
        <TraceTable data={whole} />
      </details>
    </div>
  )
}
