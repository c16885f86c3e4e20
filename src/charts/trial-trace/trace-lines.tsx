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
  const lines = [
    ...(data.weight
      ? [
          {
            key: 'weight',
            y: scales.force(data.weight.valueN),
            text: data.weight.label,
            className: 'fill-ink-2',
          },
        ]
      : []),
    ...data.feet.map((foot) => ({
      key: foot.key,
      y: scales.force(valueAt(foot.values, data.sampleRateHz, view.endS)),
      text: foot.label,
      className: `font-semibold ${footLine[foot.key].fill}`,
    })),
  ]
  const places = spreadLabels(
    lines.map((label) => label.y),
    data.weight ? 20 : 15,
    layout.force.top,
    layout.force.bottom,
  )
  const x = layout.plot.right + 6
  return (
    <g stroke="none" className="text-[12.5px]">
      {lines.map((label, i) => (
        <text
          key={label.key}
          x={x}
          y={places[i]! + (label.key === 'weight' ? -1 : 4)}
          className={label.className}
        >
          {label.text}
          {label.key === 'weight' && data.weight && (
            <tspan x={x} dy="14" className="fill-ink">
              {formatNumber(data.weight.valueN, 1)} N
            </tspan>
          )}
        </text>
      ))}
    </g>
  )
}
