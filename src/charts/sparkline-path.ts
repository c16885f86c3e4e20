import { line } from 'd3'

/**
 * A trace small enough for a table's cell: its line and the height of the force it begins at, standing still.
 * The foot of the drawing is zero force. An empty preview has no line.
 */
export function sparkline(
  preview: readonly number[],
  width: number,
  height: number,
): { path: string; standingY: number } | null {
  if (preview.length < 2) return null
  const greatest = Math.max(1, ...preview)
  const edge = 1
  const y = (forceN: number) => height - edge - (Math.max(0, forceN) / greatest) * (height - 2 * edge)
  const draw = line<number>()
    .x((_, i) => (i / (preview.length - 1)) * width)
    .y((forceN) => y(forceN))
    .digits(1)
  return { path: draw(preview) ?? '', standingY: y(standing(preview)) }
}

/** The median of the first tenth: a recording begins with quiet stance. */
function standing(preview: readonly number[]): number {
  const first = preview.slice(0, Math.max(3, Math.floor(preview.length / 10))).sort((a, b) => a - b)
  return first[Math.floor(first.length / 2)]!
}
