import { describe, expect, it } from 'vitest'
import { decimalsOf, resultsGeometry } from './results-geometry.ts'

const year = [
  { date: '2025-11-12', value: 30.8, U: 0.5 },
  { date: '2026-05-12', value: 32.6, U: null },
  { date: '2026-11-12', value: 35, U: 0.4 },
]

describe('resultsGeometry(figures, width, height)', () => {
  it('spreads the dates from edge to edge in proportion to time', () => {
    const { points, plot } = resultsGeometry(year, 360, 200)
    expect(points[0]!.x).toBe(plot.left)
    expect(points[2]!.x).toBe(plot.right)
    expect((points[1]!.x - plot.left) / (plot.right - plot.left)).toBeCloseTo(181 / 365, 3)
  })

  it('keeps every uncertainty bar on the picture, and draws none where none is known', () => {
    const { points, plot } = resultsGeometry(year, 360, 200)
    expect(points[2]!.bar!.top).toBeGreaterThanOrEqual(plot.top)
    expect(points[0]!.bar!.bottom).toBeLessThanOrEqual(plot.bottom)
    expect(points[1]!.bar).toBeNull()
  })

  it('puts a single result in the middle', () => {
    const { points, plot } = resultsGeometry([year[0]!], 360, 200)
    expect(points[0]!.x).toBe((plot.left + plot.right) / 2)
    expect(Number.isFinite(points[0]!.y)).toBe(true)
  })

  it('draws results that are all the same without dividing by nothing', () => {
    const { points } = resultsGeometry(
      [
        { date: '2026-01-01', value: 30, U: null },
        { date: '2026-02-01', value: 30, U: null },
      ],
      360,
      200,
    )
    expect(points.every((point) => Number.isFinite(point.y))).toBe(true)
  })

  it('gives no points for no figures', () => {
    expect(resultsGeometry([], 360, 200).points).toEqual([])
  })

  it('keeps every month’s name, which stands right of the month’s beginning, on the picture', () => {
    const { dateTicks, width } = resultsGeometry(
      [
        { date: '2026-01-15', value: 1, U: null },
        { date: '2026-11-01', value: 2, U: null },
      ],
      360,
      200,
    )
    expect(dateTicks.length).toBeGreaterThan(1)
    for (const { x, text } of dateTicks) expect(x + 4 + 7 * text.length).toBeLessThanOrEqual(width)
  })

  it('names each month once', () => {
    const { dateTicks } = resultsGeometry(
      [
        { date: '2026-11-01', value: 1, U: null },
        { date: '2026-11-20', value: 2, U: null },
      ],
      700,
      200,
    )
    expect(new Set(dateTicks.map((tick) => tick.text)).size).toBe(dateTicks.length)
  })
})

describe('decimalsOf(ticks)', () => {
  it.each([
    [[1.305, 1.31, 1.315], 3],
    [[29, 29.5, 30], 1],
    [[20, 30, 40], 0],
    [[1.4], 0],
  ])('of %j are those that tell neighbours apart: %i', (values, decimals) => {
    expect(decimalsOf(values.map((value) => ({ value, y: 0 })))).toBe(decimals)
  })
})
