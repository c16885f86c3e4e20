import { extent, scaleLinear, scaleUtc, utcFormat } from 'd3'

/** One day's figure in display units, oldest first. `U` null where no uncertainty is known. */
export interface DatedFigure {
  /** Calendar date, `2026-11-12`. */
  date: string
  value: number
  U: number | null
}

export interface PlacedFigure extends DatedFigure {
  x: number
  y: number
  /** Ends of the uncertainty bar; null without one. */
  bar: { top: number; bottom: number } | null
}

export interface ResultsGeometry {
  width: number
  height: number
  plot: { left: number; right: number; top: number; bottom: number }
  points: PlacedFigure[]
  valueTicks: { value: number; y: number }[]
  dateTicks: { x: number; text: string }[]
}

const margin = { left: 36, right: 24, top: 26, bottom: 26 }

/** Places of results over time. With one result it stands in the middle of its month. */
export function resultsGeometry(
  figures: readonly DatedFigure[],
  width: number,
  height: number,
): ResultsGeometry {
  const plot = {
    left: margin.left,
    right: width - margin.right,
    top: margin.top,
    bottom: height - margin.bottom,
  }
  const days = figures.map((figure) => dayOf(figure.date))
  const [first = new Date(0), last = new Date(0)] = extent(days)
  const alone = first.getTime() === last.getTime() ? 15 * dayMs : 0
  const x = scaleUtc(
    [new Date(first.getTime() - alone), new Date(last.getTime() + alone)],
    [plot.left, plot.right],
  )
  const reach = figures.flatMap(({ value, U }) => [value - (U ?? 0), value + (U ?? 0)])
  const [least = 0, greatest = 1] = extent(reach)
  const spare = (greatest - least || Math.abs(greatest) || 1) * 0.15
  const y = scaleLinear([least - spare, greatest + spare], [plot.bottom, plot.top]).nice(4)
  const dates = x.ticks(Math.max(2, Math.floor(width / 90)))
  const month = utcFormat(sameYear(first, last) ? '%b' : width < 480 ? '%b' : '%b %Y')
  const texts = dates.map((date) => month(date))
  return {
    width,
    height,
    plot,
    points: figures.map((figure, i) => ({
      ...figure,
      x: x(days[i]!),
      y: y(figure.value),
      bar: figure.U === null ? null : { top: y(figure.value + figure.U), bottom: y(figure.value - figure.U) },
    })),
    valueTicks: y.ticks(3).map((value) => ({ value, y: y(value) })),
    dateTicks: dates
      .map((date, i) => ({ x: x(date), text: texts[i]! }))
      .filter((tick, i) => i === 0 || tick.text !== texts[i - 1])
      .filter((tick) => tick.x + textLength(tick.text) <= width),
  }
}

/** Decimals that tell neighbouring ticks apart: results that lie close together need more than a figure has. */
export function decimalsOf(ticks: ResultsGeometry['valueTicks']): number {
  const [first, second] = ticks
  if (!first || !second) return 0
  return Math.max(0, -Math.floor(Math.log10(second.value - first.value) + 1e-9))
}

/** Room for a month's name right of its tick, px; a letter of the small size is about 7 wide. */
const textLength = (text: string) => 4 + 7 * text.length

const dayMs = 86_400_000
const dayOf = (date: string) => new Date(`${date}T00:00:00Z`)
const sameYear = (a: Date, b: Date) => a.getUTCFullYear() === b.getUTCFullYear()
