import { formatNumber } from '../../lib/format-figure.ts'
import { decimalsOf, type PlacedFigure, type ResultsGeometry } from './results-geometry.ts'

interface Props {
  geometry: ResultsGeometry
  decimals: number
  /** The point being read, if any. */
  read: number | null
}

/** A point a result with its bar of give or take; the newest is marked with tape and named. */
export function ResultsDrawing({ geometry, decimals, read }: Props) {
  const { plot } = geometry
  const newest = geometry.points.length - 1
  const tickDecimals = Math.max(decimals, decimalsOf(geometry.valueTicks))
  return (
    <g className="fill-ink-2 text-small">
      {geometry.valueTicks.map((tick) => (
        <g key={tick.value}>
          <line x1={plot.left} x2={plot.right} y1={tick.y} y2={tick.y} className="stroke-rule-2" />
          <text x={plot.left - 8} y={tick.y + 4} textAnchor="end">
            {formatNumber(tick.value, Number.isInteger(tick.value) ? 0 : tickDecimals)}
          </text>
        </g>
      ))}
      {geometry.dateTicks.map((tick) => (
        <g key={tick.x}>
          <line x1={tick.x} x2={tick.x} y1={plot.bottom} y2={geometry.height - 4} className="stroke-rule" />
          <text x={tick.x + 4} y={geometry.height - 6}>
            {tick.text}
          </text>
        </g>
      ))}
      {geometry.points.map((point, i) => (
        <ResultPoint key={i} point={point} newest={i === newest} read={i === read} />
      ))}
      {geometry.points[newest] && (
        <NewestFigure point={geometry.points[newest]} decimals={decimals} right={geometry.width} />
      )}
    </g>
  )
}

function ResultPoint({ point, newest, read }: { point: PlacedFigure; newest: boolean; read: boolean }) {
  return (
    <g>
      {read && <circle cx={point.x} cy={point.y} r="10" fill="none" className="stroke-ink" />}
      {point.bar && (
        <line
          x1={point.x}
          x2={point.x}
          y1={point.bar.top}
          y2={point.bar.bottom}
          className="stroke-ink"
          strokeWidth="1.4"
        />
      )}
      <circle
        cx={point.x}
        cy={point.y}
        r={newest ? 6 : 3.6}
        className={newest ? 'fill-tape stroke-ink' : 'fill-ink'}
        strokeWidth="1.2"
      />
    </g>
  )
}

function NewestFigure({ point, decimals, right }: { point: PlacedFigure; decimals: number; right: number }) {
  const y = (point.bar?.top ?? point.y - 6) - 7
  return (
    <text x={Math.min(point.x, right - 18)} y={y} textAnchor="middle" className="fill-ink font-semibold">
      {formatNumber(point.value, decimals)}
    </text>
  )
}
