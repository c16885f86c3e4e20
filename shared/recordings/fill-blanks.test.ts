import { describe, expect, it } from 'vitest'
import { fillBlanks } from './fill-blanks.ts'

describe('fillBlanks', () => {
  it('lays a straight line between the neighbours and counts', () => {
    const given = Float64Array.of(1, NaN, NaN, 4, NaN, 6)
    expect(fillBlanks(given)).toStrictEqual({
      filled: Float64Array.of(1, 2, 3, 4, 5, 6),
      count: 3,
      longestRun: 2,
    })
    expect(given[1]).toBeNaN()
  })

  it('holds the nearest value at the ends', () => {
    expect(fillBlanks(Float64Array.of(NaN, 2, NaN)).filled).toStrictEqual(Float64Array.of(2, 2, 2))
  })

  it('leaves a channel without any value blank', () => {
    expect(fillBlanks(Float64Array.of(NaN, NaN))).toMatchObject({ count: 2, longestRun: 2 })
  })
})
