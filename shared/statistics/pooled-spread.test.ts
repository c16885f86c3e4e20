import { describe, expect, it } from 'vitest'
import { pooledSpread } from './pooled-spread.ts'

describe('the pooled spread of trials', () => {
  it('is absent where nobody has two trials', () => {
    expect(pooledSpread([])).toBeNull()
    expect(pooledSpread([[1], [], [3]])).toBeNull()
  })

  it('of one athlete is the standard deviation of the trials', () => {
    expect(pooledSpread([[1, 2, 3]])).toEqual({ sd: 1, degreesOfFreedom: 2 })
  })

  it('is √MSW of Shrout & Fleiss 1979 (Psychol Bull 86:420–428), 6 targets by 4 judges: MSW 6.263889', () => {
    const ratings = [
      [9, 2, 5, 8],
      [6, 1, 3, 2],
      [8, 4, 6, 8],
      [7, 1, 2, 6],
      [10, 5, 6, 9],
      [6, 2, 4, 7],
    ]
    const pooled = pooledSpread(ratings)
    expect(pooled?.degreesOfFreedom).toBe(18)
    expect((pooled?.sd ?? 0) ** 2).toBeCloseTo(6.263889, 6)
  })

  it('is √MSW of Weir 2005 (J Strength Cond Res 19:231–240), data set A: MSW 53.75', () => {
    const first = [146, 148, 170, 90, 157, 156, 176, 205]
    const second = [140, 152, 152, 99, 145, 153, 167, 218]
    expect((pooledSpread(first.map((value, i) => [value, second[i]]))?.sd ?? 0) ** 2).toBeCloseTo(53.75, 10)
  })

  it('does not care how high each athlete jumps, nor who comes first', () => {
    const near = pooledSpread([
      [0.3, 0.32],
      [0.4, 0.41, 0.39],
    ])
    const far = pooledSpread([
      [1.39, 1.4, 1.41],
      [0.02, 0],
    ])
    expect(far?.sd).toBeCloseTo(near?.sd ?? 0, 12)
  })

  it('of equal trials is nothing, which is known', () => {
    expect(
      pooledSpread([
        [2, 2],
        [3, 3],
      ]),
    ).toEqual({ sd: 0, degreesOfFreedom: 2 })
  })

  it('keeps its precision far from zero', () => {
    expect(pooledSpread([[1e9, 1e9 + 1, 1e9 + 2]])?.sd).toBeCloseTo(1, 9)
  })
})
