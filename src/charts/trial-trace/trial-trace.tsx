import { useMemo, useState, type KeyboardEvent, type PointerEvent, type ReactNode } from 'react'
import { useWidth } from '../use-width.ts'
import { layOutTrace, type TraceLayout } from './lay-out.ts'
import { placeEvents } from './place-events.ts'
import type { TraceData, TraceEvent } from './trace-data.ts'
import { TraceDrawing } from './trace-drawing.tsx'
import { moveCursor, readTrace } from './trace-reading.ts'
import { TraceEvents, type PlacedEvent } from './trace-events.tsx'
import { traceScales, type DrawnScales, type TraceView } from './trace-scales.ts'

interface Props {
  data: TraceData
  view: TraceView
  summaryId: string
  /** In place of the data's own, while they are being moved: the picture behind them need not be drawn anew. */
  events?: TraceEvent[]
  /** Laid over the picture: what of it can be taken hold of. */
  handles?: (drawing: TraceFrame) => ReactNode
}

/** Where everything of a drawing stands. */
export interface TraceFrame {
  layout: TraceLayout
  scales: DrawnScales
  events: PlacedEvent[]
}

/**
 * Force and momentum of one trial on one time axis. Read by pointer, or by keyboard as a slider: the readout
 * under the picture says the figures at the cursor.
 */
export function TrialTrace({ data, view, summaryId, events = data.events, handles }: Props) {
  const { ref, width } = useWidth<HTMLDivElement>(900)
  const roomy = handles !== undefined
  const drawing = useDrawing(data, events, view, width, roomy)
  const [cursorS, setCursorS] = useState<number | null>(null)
  const { layout, scales } = drawing
  const within = (timeS: number) => Math.min(Math.max(timeS, view.startS), view.endS)

  const onKeyDown = (event: KeyboardEvent) => {
    const next = moveCursor(event.key, event.shiftKey, cursorS ?? view.startS, data, view)
    if (next === null) return
    event.preventDefault()
    setCursorS(next)
  }
  const onPointerMove = (event: PointerEvent<SVGSVGElement>) => {
    const box = event.currentTarget.getBoundingClientRect()
    setCursorS(within(scales.time.invert(((event.clientX - box.left) / box.width) * layout.width)))
  }

  return (
    <div ref={ref} className="relative">
      <div
        role="slider"
        tabIndex={0}
        aria-label="Read the trace"
        aria-describedby={summaryId}
        aria-valuemin={round(view.startS)}
        aria-valuemax={round(view.endS)}
        aria-valuenow={round(within(cursorS ?? view.startS))}
        aria-valuetext={`${within(cursorS ?? view.startS).toFixed(3)} s`}
        onKeyDown={onKeyDown}
      >
        <svg
          viewBox={`0 0 ${layout.width} ${layout.height}`}
          className="block w-full touch-pan-y"
          aria-hidden="true"
          onPointerMove={onPointerMove}
        >
          <TraceDrawing data={data} view={view} layout={layout} scales={scales} />
          <TraceEvents events={drawing.events} layout={layout} />
          {cursorS !== null && (
            <line
              x1={scales.time(within(cursorS))}
              x2={scales.time(within(cursorS))}
              y1={layout.eventsY}
              y2={layout.momentum.bottom}
              className="stroke-ink"
            />
          )}
        </svg>
      </div>
      {handles?.(drawing)}
      <Readout data={data} timeS={cursorS === null ? null : within(cursorS)} />
    </div>
  )
}

function Readout({ data, timeS }: { data: TraceData; timeS: number | null }) {
  const reading = timeS === null ? null : readTrace(data, timeS)
  return (
    <output aria-live="polite" className="mt-1 flex min-h-6 flex-wrap gap-x-5 text-small text-ink-2">
      {reading ? (
        <>
          <span className="tabular-nums text-ink">{reading.timeS.toFixed(3)} s</span>
          {reading.values.map((value) => (
            <span key={value.label}>
              {value.label} <span className="tabular-nums text-ink">{value.text}</span>
            </span>
          ))}
        </>
      ) : (
        <span className="no-print">
          Point at the trace, or focus it and use the arrow keys, to read it. Page keys go from event to
          event.
        </span>
      )}
    </output>
  )
}

/** Each part is made anew only where what it is made of has changed. */
function useDrawing(
  data: TraceData,
  events: TraceEvent[],
  view: TraceView,
  width: number,
  roomy: boolean,
): TraceFrame {
  const flat = useMemo(
    () => traceScales(data, view, layOutTrace(width, 1, roomy)).time,
    [data, view, width, roomy],
  )
  const { placed, tiers } = useMemo(() => placeEvents(events, view, flat), [events, view, flat])
  const layout = useMemo(() => layOutTrace(width, tiers, roomy), [width, tiers, roomy])
  const scales = useMemo(() => traceScales(data, view, layout), [data, view, layout])
  return useMemo(() => ({ layout, scales, events: placed }), [layout, scales, placed])
}

const round = (timeS: number) => Math.round(timeS * 1000) / 1000
