import { overlayDash } from './overlay-dash.ts'
import type { TraceData } from './trace-data.ts'
import { tracePath } from './trace-path.ts'
import { viewOf, type DrawnScales, type TraceView } from './trace-scales.ts'

interface Props {
  data: TraceData
  view: TraceView
  scales: DrawnScales
}

/** Force and momentum of the trials laid over, each in a dash of its own. */
export function OverlayLines({ data, view, scales }: Props) {
  return (
    <g fill="none" strokeLinejoin="round" className="stroke-ink-2" strokeWidth="1.4">
      {data.overlays.map((overlay, i) => {
        const own = viewOf(overlay, view)
        const path = (values: Float64Array, y: (value: number) => number) =>
          tracePath(values, overlay.sampleRateHz, own, {
            x: (timeS) => scales.time(timeS + overlay.startS),
            y,
          })
        return (
          <g key={overlay.key} strokeDasharray={overlayDash(i)}>
            <path d={path(overlay.total, scales.force)} />
            {overlay.momentum && <path d={path(overlay.momentum, scales.momentum)} />}
          </g>
        )
      })}
    </g>
  )
}
