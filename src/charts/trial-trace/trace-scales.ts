import { extent, scaleLinear } from 'd3'
import { decimate } from './decimate.ts'
import type { TraceData } from './trace-data.ts'
import type { TraceLayout } from './lay-out.ts'

export interface TraceView {
  startS: number
  endS: number
}

/** Time, force and momentum to pixels; force reaches down to zero, momentum shows zero. */
export function traceScales(data: TraceData, view: TraceView, layout: TraceLayout) {
  const force = range(data.total, data.sampleRateHz, view)
  const momentum = data.momentum ? range(data.momentum, data.sampleRateHz, view) : { least: 0, greatest: 0 }
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

function range(values: Float64Array, rate: number, view: TraceView) {
  const indices = decimate(values, Math.ceil(view.startS * rate), Math.floor(view.endS * rate), 400)
  const [least = 0, greatest = 0] = extent(indices, (i) => values[i])
  return { least, greatest }
}
