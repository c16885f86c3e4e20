import type { TraceLayout } from './lay-out.ts'
import type { TraceEvent } from './trace-data.ts'

export interface PlacedEvent extends TraceEvent {
  x: number
  tier: number
}

/** Events as squares of tape, each with its name above and a line down through both panels. */
export function TraceEvents({ events, layout }: { events: PlacedEvent[]; layout: TraceLayout }) {
  return (
    <g>
      {events.map((event) => (
        <g key={event.key}>
          <line
            x1={event.x}
            x2={event.x}
            y1={layout.eventsY - event.tier * layout.tierPx}
            y2={layout.momentum.bottom}
            className="stroke-ink-2"
            strokeOpacity="0.55"
            strokeDasharray="1 3"
          />
          <rect
            x={event.x - 4.5}
            y={layout.eventsY - 4.5}
            width="9"
            height="9"
            className="fill-tape stroke-ink"
            strokeWidth="1"
          />
          <text
            x={event.x}
            y={layout.eventsY - 10 - event.tier * layout.tierPx}
            textAnchor="middle"
            className="fill-ink stroke-sheet text-[12.5px]"
            strokeWidth="4"
            paintOrder="stroke"
          >
            {event.label}
            {event.adjusted && ' (adjusted)'}
          </text>
        </g>
      ))}
    </g>
  )
}
