import { describe, expect, it } from 'vitest'
import { columnMapSchema } from './column-map.ts'

const time = { index: 0, name: 'Time (s)', unit: 's' }
const force = (index: number, channel: string): object => ({ index, name: 'F', unit: 'N', channel })

describe('columnMapSchema', () => {
  it.each([
    ['both feet', { time, forces: [force(1, 'left'), force(2, 'right')] }],
    ['one plate in parts', { time, forces: [force(1, 'single'), force(2, 'single')] }],
    ['a rate instead of a time', { time: null, sampleRateHz: 500, forces: [force(0, 'total')] }],
  ])('takes %s', (_, map) => {
    expect(columnMapSchema.safeParse(map).success).toBe(true)
  })

  it.each([
    ['one foot alone', { time, forces: [force(1, 'left')] }],
    ['a foot beside a total', { time, forces: [force(1, 'left'), force(2, 'total')] }],
    ['a column used twice', { time, forces: [force(0, 'single')] }],
    ['no force', { time, forces: [] }],
    ['an unknown key', { time, forces: [force(1, 'single')], plate: 2 }],
  ])('refuses %s', (_, map) => {
    expect(columnMapSchema.safeParse(map).success).toBe(false)
  })
})
