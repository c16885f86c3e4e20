/** Where the parts of the trace stand, in pixels from the top left. */
export interface TraceLayout {
  width: number
  height: number
  plot: { left: number; right: number }
  /** Baseline of the squares; names stand in tiers above it. */
  eventsY: number
  force: { top: number; bottom: number }
  momentum: { top: number; bottom: number }
  timeAxisY: number
  narrow: boolean
  /** From one tier of names to the next. */
  tierPx: number
}

const closeTierPx = 15
/** Where each name is a handle to be pressed (WCAG 2.2, 2.5.8: 24 px). */
const handleTierPx = 24

/** Below this width the drawing is on a phone: thinner margins, lower panels. */
const narrowPx = 620

/** @param handles whether the events' names have to be large enough to be pressed */
export function layOutTrace(width: number, eventTiers: number, handles = false): TraceLayout {
  const narrow = width < narrowPx
  const tierPx = handles ? handleTierPx : closeTierPx
  const eventsY = 8 + tierPx * Math.max(1, eventTiers) + 8
  const forceTop = eventsY + 12
  const forceBottom = forceTop + (narrow ? 220 : 345)
  const momentumTop = forceBottom + 44
  const momentumBottom = momentumTop + (narrow ? 80 : 108)
  return {
    width,
    height: momentumBottom + 30,
    plot: { left: narrow ? 40 : 58, right: width - (narrow ? 34 : 100) },
    eventsY,
    force: { top: forceTop, bottom: forceBottom },
    momentum: { top: momentumTop, bottom: momentumBottom },
    timeAxisY: momentumBottom + 20,
    narrow,
    tierPx,
  }
}
