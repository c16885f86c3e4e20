import { memo } from 'react'
import { sparkline } from './sparkline-path.ts'

const width = 104
const height = 36

/** A trial's force at a glance. Decoration beside the figures that name it: hidden from assistive technology. */
export const Sparkline = memo(function Sparkline({
  preview,
  quiet = false,
}: {
  preview: readonly number[]
  quiet?: boolean
}) {
  const drawn = sparkline(preview, width, height)
  if (!drawn) return <span className="inline-block h-9 w-26" aria-hidden="true" />
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      className="shrink-0"
      aria-hidden="true"
    >
      <line x1="0" x2={width} y1={drawn.standingY} y2={drawn.standingY} className="stroke-rule" />
      <path d={drawn.path} fill="none" className={quiet ? 'stroke-ink-2' : 'stroke-ink'} strokeWidth="1.2" />
    </svg>
  )
})
