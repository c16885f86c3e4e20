import { memo } from 'react'
import type { TraceLayout } from './lay-out.ts'
import { TraceAxes } from './trace-axes.tsx'
import { OverlayLines } from './overlay-lines.tsx'
import type { TraceData, TraceSpan } from './trace-data.ts'
import { TraceLines } from './trace-lines.tsx'
import { PhaseFigures, TracePhases } from './trace-phases.tsx'
import { phaseShape } from './phase-shapes.ts'
import type { DrawnScales, TraceView } from './trace-scales.ts'

interface Props {
  data: TraceData
  view: TraceView
  layout: TraceLayout
  scales: DrawnScales
}

/** All of the trace that does not move with the cursor; drawn once for a width and a view. */
export const TraceDrawing = memo(function TraceDrawing({ data, view, layout, scales }: Props) {
  const { weight } = data
  const shapes = weight
    ? data.phases.map((phase) => phaseShape(phase, data.total, data.sampleRateHz, weight.valueN, scales))
    : []
  return (
    <g>
      {data.span && <MarkedSpan span={data.span} layout={layout} scales={scales} />}
      <TraceAxes layout={layout} scales={scales} withMomentum={data.momentum !== null} />
      <TracePhases shapes={shapes} />
      <OverlayLines data={data} view={view} scales={scales} />
      <TraceLines data={data} view={view} layout={layout} scales={scales} />
      <PhaseFigures shapes={shapes} layout={layout} />
      <TakeoffMomentum data={data} scales={scales} />
    </g>
  )
})

interface MarkedSpanProps extends Pick<Props, 'layout' | 'scales'> {
  span: TraceSpan
}

/** A band behind the force, with its name at the top. */
function MarkedSpan({ span, layout, scales }: MarkedSpanProps) {
  const [from, to] = [scales.time(span.startS), scales.time(span.endS)]
  const { top, bottom } = layout.force
  return (
    <g>
      <rect x={from} y={top} width={to - from} height={bottom - top} className="fill-band stroke-ink-2" />
      <text x={(from + to) / 2} y={top + 16} textAnchor="middle" className="fill-ink text-[12.5px]">
        {span.label}
      </text>
    </g>
  )
}

/** The momentum that the athlete left the ground with, marked where the trace shows it. */
function TakeoffMomentum({ data, scales }: { data: TraceData; scales: DrawnScales }) {
  const takeoff = data.events.find((event) => event.key === 'takeoff')
  if (!takeoff || !data.momentum) return null
  const sample = Math.min(data.momentum.length - 1, Math.round(takeoff.timeS * data.sampleRateHz))
  return (
    <circle
      cx={scales.time(takeoff.timeS)}
      cy={scales.momentum(data.momentum[sample]!)}
      r="4.5"
      className="fill-tape stroke-ink"
    />
  )
}
