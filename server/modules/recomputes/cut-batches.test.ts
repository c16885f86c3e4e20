import { describe, expect, it } from 'vitest'
import { cutBatches } from './cut-batches.ts'

const trials = (...samples: number[]) => samples.map((count, n) => ({ trialId: `${n}`, samples: count }))
const sizes = (...samples: number[]) => cutBatches(trials(...samples)).map((batch) => batch.length)

describe('the jobs of a recompute', () => {
  it('hold fifty trials of a usual length each', () => {
    expect(sizes(...Array<number>(120).fill(8000))).toEqual([50, 50, 20])
    expect(sizes(...Array<number>(50).fill(100))).toEqual([50])
  })
  it('hold fewer where recordings are long, and the longest alone', () => {
    expect(sizes(...Array<number>(4).fill(200_000))).toEqual([2, 2])
    expect(sizes(2_000_000, 2_000_000)).toEqual([1, 1])
  })
  it('hold every trial once, in order', () => {
    const long = Array.from({ length: 230 }, (_, n) => 1000 * (n % 40))
    expect(cutBatches(trials(...long)).flat()).toEqual(long.map((_, n) => `${n}`))
  })
  it('are none of nothing', () => expect(cutBatches([])).toEqual([]))
})
