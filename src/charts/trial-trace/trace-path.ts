import { line } from 'd3'
import { decimate } from './decimate.ts'

/** The line of a channel between two instants, with no sample dropped that a pixel would show. */
export function tracePath(
  values: Float64Array,
  sampleRateHz: number,
  view: { startS: number; endS: number },
  scales: { x: (timeS: number) => number; y: (value: number) => number },
): string {
  const columns = Math.max(1, Math.ceil(scales.x(view.endS) - scales.x(view.startS)))
  const from = Math.ceil(view.startS * sampleRateHz)
  const to = Math.floor(view.endS * sampleRateHz)
  const draw = line<number>()
    .x((i) => scales.x(i / sampleRateHz))
    .y((i) => scales.y(values[i]!))
    .digits(1)
  return draw(decimate(values, from, to, columns)) ?? ''
}
