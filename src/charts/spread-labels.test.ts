import { describe, expect, it } from 'vitest'
import { spreadLabels } from './spread-labels.ts'

describe('spreadLabels(wanted, gap, from, to)', () => {
  it('leaves labels alone that are far enough apart', () => {
    expect(spreadLabels([10, 40, 90], 15, 0, 100)).toEqual([10, 40, 90])
  })

  it('pushes near ones apart in their own order, answering in the order given', () => {
    expect(spreadLabels([52, 50], 15, 0, 100)).toEqual([65, 50])
  })

  it('keeps the last one inside and moves those before it back', () => {
    expect(spreadLabels([95, 96, 97], 10, 0, 100)).toEqual([80, 90, 100])
  })

  it('keeps the gap where they cannot all fit', () => {
    expect(spreadLabels([5, 5, 5], 10, 0, 15)).toEqual([0, 10, 20])
  })

  it('gives nothing for nothing', () => {
    expect(spreadLabels([], 10, 0, 15)).toEqual([])
  })
})
