import { describe, expect, it } from 'vitest'
import { limits } from '../../../shared/contracts/limits.ts'
import { chunkCount, chunkLength } from './chunks.ts'

const { chunkBytes, fileBytes } = limits

describe('the chunks of a file', () => {
  it.each([
    [0, 0],
    [1, 1],
    [chunkBytes, 1],
    [chunkBytes + 1, 2],
    [fileBytes, 64],
  ])('of %i bytes are %i', (sizeBytes, count) => {
    expect(chunkCount(sizeBytes)).toBe(count)
  })

  it.each([0, 1, 17, chunkBytes - 1, chunkBytes, 3 * chunkBytes + 5])(
    'of %i bytes add up to the file',
    (sizeBytes) => {
      const lengths = Array.from({ length: chunkCount(sizeBytes) }, (_, n) => chunkLength(sizeBytes, n))
      expect(lengths.reduce((sum, length) => sum + length, 0)).toBe(sizeBytes)
      expect(lengths.every((length) => length > 0 && length <= chunkBytes)).toBe(true)
    },
  )

  it('have no length beyond the end', () => {
    expect(chunkLength(chunkBytes, 1)).toBeLessThanOrEqual(0)
    expect(chunkLength(0, 0)).toBeLessThanOrEqual(0)
  })
})
