import { describe, expect, it } from 'vitest'
import { limits } from '../../../shared/contracts/limits.ts'
import { arrivedPercent } from './chunk-plan.ts'

const MIB = limits.chunkBytes

describe('arrivedPercent(upload)', () => {
  it('counts bytes, not pieces: the last piece may be a short one', () => {
    expect(arrivedPercent({ sizeBytes: 2 * MIB + 10, chunksReceived: [2] })).toBe(0)
    expect(arrivedPercent({ sizeBytes: 4 * MIB, chunksReceived: [0, 3] })).toBe(50)
  })

  it('is 100 only when all is there, which an empty file is at once', () => {
    expect(
      arrivedPercent({ sizeBytes: 63 * MIB + 1, chunksReceived: Array.from({ length: 63 }, (_, n) => n) }),
    ).toBe(99)
    expect(arrivedPercent({ sizeBytes: 10, chunksReceived: [0] })).toBe(100)
    expect(arrivedPercent({ sizeBytes: 0, chunksReceived: [] })).toBe(100)
  })
})
