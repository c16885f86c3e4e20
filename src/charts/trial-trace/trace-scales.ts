import { extent, scaleLinear } from 'd3'
import { decimate } from './decimate.ts'
import type { TraceData, TraceOverlay } from './trace-data.ts'
import type { TraceLayout } from './lay-out.ts'

export interface TraceView {
  startS: number
  endS: number
}

/** Time, force and momentum to pixels; force reaches down to zero, momentum shows zero. */
export function traceScales(data: TraceData, view: TraceView, layout: TraceLayout) {
  const overlaid = data.overlays.map((overlay) => ({ ...overlay, view: viewOf(overlay, view) }))
  const force = joined([
    range(data.total, data.sampleRateHz, view),
    ...overlaid.map((other) => range(other.total, other.sampleRateHz, other.view)),
  ])
  const momenta = [{ ...data, view }, ...overlaid].flatMap((one) =>
    one.momentum ? [range(one.momentum, one.sampleRateHz, one.view)] : [],
  )
  const momentum = joined([{ least: 0, greatest: 0 }, ...momenta])
  const reach = Math.max(1, -momentum.least, momentum.greatest) * 1.08
  return {
    time: scaleLinear([view.startS, view.endS], [layout.plot.left, layout.plot.right]),
    force: scaleLinear(
      [Math.min(0, force.least), Math.max(1, force.greatest) * 1.04],
      [layout.force.bottom, layout.force.top],
    ),
    momentum: scaleLinear([-reach, reach], [layout.momentum.bottom, layout.momentum.top]),
  }
}
export type DrawnScales = ReturnType<typeof traceScales>

/** The view on the overlaid trial's own time axis. */
export const viewOf = ({ startS }: Pick<TraceOverlay, 'startS'>, view: TraceView): TraceView => ({
  startS: view.startS - startS,
  endS: view.endS - startS,
})

interface Range {
  least: number
  greatest: number
}

const joined = (ranges: Range[]): Range => ({
  least: Math.min(...ranges.map(({ least }) => least)),
  greatest: Math.max(...ranges.map(({ greatest }) => greatest)),
})

function range(values: Float64Array, rate: number, view: TraceView): Range {
  const indices = decimate(values, Math.ceil(view.startS * rate), Math.floor(view.endS * rate), 400)
  const [least = 0, greatest = 0] = extent(indices, (i) => values[i])
  return { least, greatest }
}
