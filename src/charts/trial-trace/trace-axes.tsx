import { formatNumber } from '../../lib/format-figure.ts'
import { formatSigned } from '../../lib/format-signed.ts'
import type { TraceLayout } from './lay-out.ts'
import type { DrawnScales } from './trace-scales.ts'

/** Grid, ticks and units of the force panel, the momentum panel and the time that both share. */
export function TraceAxes({
  layout,
  scales,
  withMomentum,
}: {
  layout: TraceLayout
  scales: DrawnScales
  withMomentum: boolean
}) {
  const { left, right } = layout.plot
  const seconds = scales.time.ticks(layout.narrow ? 4 : 8)
  const tick = scales.time.tickFormat(layout.narrow ? 4 : 8)
  const forces = scales.force.ticks(layout.narrow ? 3 : 5).filter((force) => force >= 0)
  const reach = scales.momentum.ticks(4).at(-1) ?? 0
  const momenta = withMomentum ? [-reach, 0, reach] : []
  return (
    <g className="fill-ink-2 text-[12.5px]">
      <text x={left - 8} y={layout.force.top - 12} textAnchor="end">
        N
      </text>
      {forces.map((force) => (
        <g key={force}>
          <line
            x1={left}
            x2={right}
            y1={scales.force(force)}
            y2={scales.force(force)}
            className="stroke-rule-2"
          />
          <text x={left - 8} y={scales.force(force) + 4} textAnchor="end">
            {formatNumber(force, 0)}
          </text>
        </g>
      ))}
      {withMomentum && (
        <text x={left} y={layout.momentum.top - 14}>
          momentum, kg·m/s
        </text>
      )}
      {momenta.map((momentum) => (
        <g key={momentum}>
          {momentum === 0 && (
            <line
              x1={left}
              x2={right}
              y1={scales.momentum(0)}
              y2={scales.momentum(0)}
              className="stroke-rule"
            />
          )}
          <text x={left - 8} y={scales.momentum(momentum) + 4} textAnchor="end">
            {momentum === 0 ? '0' : formatSigned(momentum, 0)}
          </text>
        </g>
      ))}
      {seconds.map((second, i) => (
        <text key={second} x={scales.time(second)} y={layout.timeAxisY} textAnchor="middle">
          {i === 0 ? `${tick(second)} s` : tick(second)}
        </text>
      ))}
    </g>
  )
}
