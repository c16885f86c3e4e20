import { formatNumber } from '../../lib/format-figure.ts'
import { spreadLabels } from '../spread-labels.ts'
import type { TraceLayout } from './lay-out.ts'
import type { TraceChannel, TraceData } from './trace-data.ts'
import { tracePath } from './trace-path.ts'
import type { DrawnScales, TraceView } from './trace-scales.ts'
import { valueAt } from './value-at.ts'

/** Left is pine and solid, right is plum and dashed: never colour alone. */
const footLine = {
  left: { stroke: 'stroke-left', fill: 'fill-left', dash: undefined },
  right: { stroke: 'stroke-right', fill: 'fill-right', dash: '5 3' },
} satisfies Record<TraceChannel['key'], { stroke: string; fill: string; dash: string | undefined }>

interface Props {
  data: TraceData
  view: TraceView
  layout: TraceLayout
  scales: DrawnScales
}

/** Force together, force of each foot, weight and momentum, each named at its end. */
export function TraceLines({ data, view, layout, scales }: Props) {
  const force = (values: Float64Array) =>
    tracePath(values, data.sampleRateHz, view, { x: scales.time, y: scales.force })
  return (
    <g fill="none" strokeLinejoin="round">
      {data.weight && (
        <line
          x1={layout.plot.left}
          x2={layout.plot.right}
          y1={scales.force(data.weight.valueN)}
          y2={scales.force(data.weight.valueN)}
          className="stroke-ink"
          strokeOpacity="0.6"
        />
      )}
      {data.feet.map((foot) => (
        <path
          key={foot.key}
          d={force(foot.values)}
          className={footLine[foot.key].stroke}
          strokeWidth="1.4"
          strokeDasharray={footLine[foot.key].dash}
        />
      ))}
      <path d={force(data.total)} className="stroke-ink" strokeWidth="1.8" />
      {data.momentum && (
        <path
          d={tracePath(data.momentum, data.sampleRateHz, view, { x: scales.time, y: scales.momentum })}
          className="stroke-ink"
          strokeWidth="1.8"
        />
      )}
      <EndLabels data={data} view={view} layout={layout} scales={scales} />
    </g>
  )
}

function EndLabels({ data, view, layout, scales }: Props) {
  const feet = data.feet.map((foot) => ({
    key: foot.key,
    y: scales.force(valueAt(foot.values, data.sampleRateHz, view.endS)),
    text: foot.label,
    className: `font-semibold ${footLine[foot.key].fill}`,
  }))
  const others = data.overlays.map((overlay) => ({
    key: overlay.key,
    y: scales.force(valueAt(overlay.total, overlay.sampleRateHz, view.endS - overlay.startS)),
    text: overlay.label,
    className: 'font-semibold fill-ink-2',
  }))
  const ends = [...feet, ...others]
  const weightY = data.weight && !layout.narrow ? [scales.force(data.weight.valueN)] : []
  const wanted = [...weightY, ...ends.map((end) => end.y)]
  const places = spreadLabels(wanted, weightY.length > 0 ? 20 : 15, layout.force.top, layout.force.bottom)
  const endPlaces = places.slice(weightY.length)
  return (
    <g stroke="none" className="text-[12.5px]">
      <WeightLabel
        data={data}
        layout={layout}
        scales={scales}
        y={weightY.length > 0 ? places[0] : undefined}
      />
      {ends.map((end, i) => (
        <text key={end.key} x={layout.plot.right + 6} y={endPlaces[i]! + 4} className={end.className}>
          {end.text}
        </text>
      ))}
    </g>
  )
}

interface WeightLabelProps {
  data: TraceData
  layout: TraceLayout
  scales: DrawnScales
  y: number | undefined
}

/** At the line's end; on a phone, where there is no room beside the plot, over it. */
function WeightLabel({ data: { weight }, layout, scales, y }: WeightLabelProps) {
  if (!weight) return null
  const newtons = `${formatNumber(weight.valueN, 1)} N`
  if (y === undefined) {
    return (
      <text
        x={layout.plot.right}
        y={scales.force(weight.valueN) - 12}
        textAnchor="end"
        className="fill-ink-2 stroke-sheet"
        strokeWidth="4"
        paintOrder="stroke"
      >
        {weight.label} {newtons}
      </text>
    )
  }
  const x = layout.plot.right + 6
  return (
    <text x={x} y={y - 1} className="fill-ink-2">
      {weight.label}
      <tspan x={x} dy="14" className="fill-ink">
        {newtons}
      </tspan>
    </text>
  )
}
