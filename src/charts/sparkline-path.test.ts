import { describe, expect, it } from 'vitest'
import { sparkline } from './sparkline-path.ts'

describe('sparkline(preview, width, height)', () => {
  it('has nothing to draw for fewer than two values', () => {
    expect(sparkline([], 100, 36)).toBeNull()
    expect(sparkline([800], 100, 36)).toBeNull()
  })

  it('runs from edge to edge, the greatest force at the top and zero at the foot', () => {
    expect(sparkline([0, 1000, 500], 100, 36)?.path).toBe('M0,35L50,1L100,18')
  })

  it('puts the standing line where the recording begins, unmoved by one odd value', () => {
    const preview = [500, 500, 0, 500, 1000]
    expect(sparkline(preview, 100, 36)?.standingY).toBe(18)
  })

  it('shows the movement and little of the standing before and after it', () => {
    const still = new Array<number>(50).fill(500)
    const jump = [300, 1000, 0, 0, 1500]
    const path = sparkline([...still, ...jump, ...still], 100, 36)?.path
    expect(path?.split('L')).toHaveLength(jump.length + 2 * Math.ceil(0.06 * 105))
  })

  it('draws a record of nothing but zeros along the foot', () => {
    expect(sparkline([0, 0], 10, 36)?.path).toBe('M0,35L10,35')
  })
})
