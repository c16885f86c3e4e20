import { describe, expect, it } from 'vitest'
import { moveCell } from './move-cell.ts'

const lengths = [3, 0, 1, 2]

describe('moveCell(key, place, lengths)', () => {
  it('moves along a row and stops at its ends', () => {
    expect(moveCell('ArrowRight', { row: 0, column: 1 }, lengths)).toEqual({ row: 0, column: 2 })
    expect(moveCell('ArrowRight', { row: 0, column: 2 }, lengths)).toBeNull()
    expect(moveCell('ArrowLeft', { row: 0, column: 0 }, lengths)).toBeNull()
  })

  it('passes over athletes without trials and keeps to what a shorter row has', () => {
    expect(moveCell('ArrowDown', { row: 0, column: 2 }, lengths)).toEqual({ row: 2, column: 0 })
    expect(moveCell('ArrowUp', { row: 2, column: 0 }, lengths)).toEqual({ row: 0, column: 0 })
  })

  it('stops at the first and the last row', () => {
    expect(moveCell('ArrowUp', { row: 0, column: 0 }, lengths)).toBeNull()
    expect(moveCell('ArrowDown', { row: 3, column: 0 }, lengths)).toBeNull()
  })

  it('goes to the ends of the row with Home and End', () => {
    expect(moveCell('End', { row: 0, column: 0 }, lengths)).toEqual({ row: 0, column: 2 })
    expect(moveCell('Home', { row: 3, column: 1 }, lengths)).toEqual({ row: 3, column: 0 })
  })

  it('leaves other keys alone', () => {
    expect(moveCell('Enter', { row: 0, column: 0 }, lengths)).toBeNull()
  })
})
