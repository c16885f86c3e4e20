import { line } from 'd3'

/**
 * A trace small enough for a table's cell: its line and the height of the force it begins at, standing still.
 * The foot of the drawing is zero force. An empty preview has no line.
 */
export function sparkline(
  whole: readonly number[],
  width: number,
  height: number,
): { path: string; standingY: number } | null {
  if (whole.length < 2) return null
  const standingN = standing(whole)
  const preview = aroundMovement(whole, standingN)
  const greatest = Math.max(1, ...preview)
  const edge = 1
  const y = (forceN: number) => height - edge - (Math.max(0, forceN) / greatest) * (height - 2 * edge)
  const draw = line<number>()
    .x((_, i) => (i / (preview.length - 1)) * width)
    .y((forceN) => y(forceN))
    .digits(1)
  return { path: draw(preview) ?? '', standingY: y(standingN) }
}

/** The median of the first tenth: a recording begins with quiet stance. */
function standing(preview: readonly number[]): number {
  const first = preview.slice(0, Math.max(3, Math.floor(preview.length / 10))).sort((a, b) => a - b)
  return first[Math.floor(first.length / 2)]!
}

/** A deviation from standing that is movement, as a share of the standing force. */
const movement = 0.12
/** Of the whole record, what is shown of standing still on either side of the movement. */
const lead = 0.06

/** The stretch of the movement with a little stillness on either side; all of it where nothing moves. */
function aroundMovement(preview: readonly number[], standingN: number): readonly number[] {
  const moves = (forceN: number) => Math.abs(forceN - standingN) > movement * standingN
  const first = preview.findIndex(moves)
  const last = preview.findLastIndex(moves)
  if (last - first < 2) return preview
  const beside = Math.ceil(lead * preview.length)
  return preview.slice(Math.max(0, first - beside), last + beside + 1)
}
