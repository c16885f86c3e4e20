import { useRef, type KeyboardEvent, type PointerEvent } from 'react'
import type { EventName } from '../../../shared/mechanics/types.ts'
import { eventNameWidth } from './place-events.ts'
import type { PlacedEvent } from './trace-events.tsx'
import type { TraceFrame } from './trial-trace.tsx'

export interface HandleActs {
  /** Bounds within which the event can be put, seconds. */
  bounds: (key: EventName) => { from: number; to: number }
  /** Moves an event to an instant; the nearest sample within its bounds is for the caller to find. */
  onMove: (key: EventName, timeS: number) => void
  /** Moves it by so many samples. */
  onStep: (key: EventName, samples: number) => void
  onAutomatic: (key: EventName) => void
  /** Puts it back where it stood when `onHold` was called last. */
  onCancel: (key: EventName) => void
  /** It has got the focus or is being dragged: what follows can be cancelled. */
  onHold: (key: EventName) => void
}

interface Props extends HandleActs {
  frame: TraceFrame
  describedBy: string
}

/** Samples that an arrow key moves an event by, and with Shift. */
const fineSamples = 1
const coarseSamples = 10

/** The events of a trace as handles, to be moved by keyboard or pointer. Lies over the drawing, in its coordinates. */
export function EventHandles({ frame, describedBy, ...acts }: Props) {
  const { layout } = frame
  return (
    <svg
      viewBox={`0 0 ${layout.width} ${layout.height}`}
      className="pointer-events-none absolute inset-x-0 top-0 block w-full"
    >
      {frame.events.map((event) => (
        <EventHandle key={event.key} event={event} frame={frame} describedBy={describedBy} {...acts} />
      ))}
    </svg>
  )
}

function EventHandle({ event, frame, describedBy, ...acts }: Props & { event: PlacedEvent }) {
  const { layout, scales } = frame
  const dragging = useRef(false)
  const { from, to } = acts.bounds(event.key)
  const onKeyDown = (pressed: KeyboardEvent) => {
    if (act(pressed, event.key, acts)) pressed.preventDefault()
  }
  const onPointerDown = (pointer: PointerEvent<SVGGElement>) => {
    pointer.currentTarget.focus()
    pointer.currentTarget.setPointerCapture(pointer.pointerId)
    acts.onHold(event.key)
    dragging.current = true
  }
  const onPointerMove = (pointer: PointerEvent<SVGGElement>) => {
    const svg = pointer.currentTarget.ownerSVGElement
    if (!dragging.current || !svg) return
    const box = svg.getBoundingClientRect()
    acts.onMove(event.key, scales.time.invert(((pointer.clientX - box.left) / box.width) * layout.width))
  }
  const release = () => {
    dragging.current = false
  }
  const nameY = layout.eventsY - 10 - event.tier * layout.tierPx
  const width = Math.max(24, eventNameWidth(event) + 4)
  return (
    <g
      role="slider"
      tabIndex={0}
      aria-label={event.label}
      aria-describedby={describedBy}
      aria-valuemin={round(from)}
      aria-valuemax={round(to)}
      aria-valuenow={round(event.timeS)}
      aria-valuetext={`${event.timeS.toFixed(4)} s, ${event.adjusted ? 'adjusted' : 'automatic'}`}
      className="event-handle pointer-events-auto cursor-ew-resize touch-none"
      onKeyDown={onKeyDown}
      onFocus={() => acts.onHold(event.key)}
      onPointerDown={onPointerDown}
      onPointerMove={onPointerMove}
      onPointerUp={release}
      onPointerCancel={release}
    >
      <rect x={event.x - width / 2} y={nameY - 16} width={width} height={24} className="fill-transparent" />
      <rect x={event.x - 12} y={layout.eventsY - 9} width={24} height={24} className="fill-transparent" />
      <rect
        x={event.x - 6}
        y={layout.eventsY - 6}
        width="12"
        height="12"
        className="event-handle-mark fill-tape stroke-ink"
        strokeWidth={event.adjusted ? 2.5 : 1}
      />
    </g>
  )
}

/** What a key does to an event; false for a key that is not ours. */
function act({ key, shiftKey }: KeyboardEvent, event: EventName, acts: HandleActs): boolean {
  const step = shiftKey ? coarseSamples : fineSamples
  switch (key) {
    case 'ArrowRight':
    case 'ArrowUp':
      acts.onStep(event, step)
      return true
    case 'ArrowLeft':
    case 'ArrowDown':
      acts.onStep(event, -step)
      return true
    case 'Home':
      acts.onAutomatic(event)
      return true
    case 'Escape':
      acts.onCancel(event)
      return true
    default:
      return false
  }
}

const round = (timeS: number) => Math.round(timeS * 10_000) / 10_000
