import { useId } from 'react'
import type { Phase } from '../../../shared/mechanics/types.ts'
import { formatSigned } from '../../lib/format-signed.ts'
import type { TraceLayout } from './lay-out.ts'
import type { PhaseShape } from './phase-shapes.ts'

/** Phases that stop a fall stand darker than those beside them, so that neighbours can be told apart. */
const dark = new Set<Phase>(['braking', 'landing'])

/** The phases' areas between force and weight: solid where the push lifts or slows, hatched where it lets sink. */
export function TracePhases({ shapes }: { shapes: PhaseShape[] }) {
  const hatch = useId()
  return (
    <g>
      <defs>
        <pattern id={hatch} width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <line x1="0" y1="0" x2="0" y2="6" className="stroke-ink" strokeOpacity="0.45" strokeWidth="1" />
        </pattern>
      </defs>
      {shapes.map((shape, i) => (
        <g key={i}>
          <path d={shape.above} className="fill-ink" fillOpacity={dark.has(shape.phase) ? 0.32 : 0.16} />
          <path d={shape.below} fill={`url(#${hatch})`} />
        </g>
      ))}
    </g>
  )
}

/**
 * The net impulse of each phase, written in its area, or beside it where the area is too narrow. On a phone there
 * is no room beside: those that do not fit are left to the ledger.
 */
export function PhaseFigures({ shapes, layout }: { shapes: PhaseShape[]; layout: TraceLayout }) {
  return (
    <g className="fill-ink text-[13px] font-semibold">
      {shapes.map((shape, i) => {
        if (!shape.label) return null
        const text = formatSigned(shape.netImpulse, 0)
        const width = text.length * 7.5 + 6
        const inside = shape.label.room >= width && shape.label.height >= 18
        // Beside a flight stands the next contact's figure.
        if (!inside && (layout.narrow || shape.phase === 'flight')) return null
        // Braking runs into propulsion at its right: the free side is the left.
        const left = shape.phase === 'braking'
        const edge = shape.label.x + (shape.label.room / 2 + 6) * (left ? -1 : 1)
        return (
          <text
            key={i}
            x={inside ? shape.label.x : left ? edge : Math.min(edge, layout.plot.right - width)}
            y={shape.label.y + 4}
            textAnchor={inside ? 'middle' : left ? 'end' : 'start'}
            className="stroke-sheet"
            strokeWidth="4"
            strokeLinejoin="round"
            paintOrder="stroke"
          >
            {text}
          </text>
        )
      })}
    </g>
  )
}
