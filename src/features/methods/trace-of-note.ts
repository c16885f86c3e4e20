import type { EventName, Phase } from '../../../shared/mechanics/types.ts'
import type { TraceData, TraceSpan } from '../../charts/trial-trace/trace-data.ts'
import type { TraceView } from '../../charts/trial-trace/trace-scales.ts'

/** What is drawn before and after the stretch that a figure is read from, seconds. */
const marginS = 0.3

/** The same round a stretch that is marked as a whole: enough to see what follows it. */
const aroundSpanS = 1.2

/**
 * The trace with only what a figure is read from marked: its events, and the phases between them, or its own phase
 * where none lies between; and the stretch of time that shows it.
 */
export function traceOfNote(
  data: TraceData,
  { events, phase, span }: { events: readonly EventName[]; phase: Phase | null; span?: TraceSpan | null },
): { data: TraceData; view: TraceView } {
  if (span) {
    const endS = Math.min(data.durationS, span.endS + aroundSpanS)
    const shown = { ...data, events: [], phases: [], span }
    return { data: shown, view: { startS: Math.max(0, span.startS - aroundSpanS), endS } }
  }
  const marked = data.events.filter(({ key }) => events.some((event) => event === key))
  const times = marked.map(({ timeS }) => timeS)
  const between = data.phases.filter(
    ({ startS, endS }) => startS >= Math.min(...times) - 1e-9 && endS <= Math.max(...times) + 1e-9,
  )
  const phases = between.length > 0 ? between : data.phases.filter((one) => one.phase === phase)
  const ends = [...times, ...phases.flatMap(({ startS, endS }) => [startS, endS])]
  // A figure of the stance alone is read before its one event.
  const startS = phases.length === 0 ? 0 : Math.max(0, Math.min(...ends) - marginS)
  const endS = Math.min(data.durationS, Math.max(...ends) + marginS)
  return { data: { ...data, events: marked, phases }, view: { startS, endS } }
}
