import { describe, expect, it } from 'vitest'
import { decimate } from './decimate.ts'

describe('decimate(values, from, to, columns)', () => {
  it('gives nothing for an empty stretch', () => {
    expect(decimate(new Float64Array(0), 0, 10, 5)).toEqual([])
    expect(decimate(new Float64Array(10), 7, 3, 5)).toEqual([])
  })

  it('keeps every sample where there are no more than two a column', () => {
    expect(decimate(Float64Array.of(3, 1, 2), 0, 2, 2)).toEqual([0, 1, 2])
  })

  it('keeps a spike that is one sample wide, up or down', () => {
    const values = new Float64Array(10_000)
    values[4321] = 900
    values[7654] = -50
    const kept = decimate(values, 0, values.length - 1, 300)
    expect(kept).toContain(4321)
    expect(kept).toContain(7654)
  })

  it('keeps the first and the last sample, in rising order without repeats, within two a column', () => {
    const values = Float64Array.from({ length: 8000 }, (_, i) => Math.sin(i / 50))
    const kept = decimate(values, 100, 7900, 400)
    expect(kept[0]).toBe(100)
    expect(kept[kept.length - 1]).toBe(7900)
    expect(kept.length).toBeLessThanOrEqual(802)
    expect(kept.every((index, i) => i === 0 || index > kept[i - 1]!)).toBe(true)
  })

  it('stays inside the record when asked for more than there is', () => {
    const kept = decimate(Float64Array.of(1, 2, 3), -5, 50, 10)
    expect(kept).toEqual([0, 1, 2])
  })
})
