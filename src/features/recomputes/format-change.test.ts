import { describe, expect, it } from 'vitest'
import { displayOf, figureName, formatChange, formatMultiple } from './format-change.ts'

describe('a change', () => {
  const height = displayOf('jumpHeightImpulse', 'both')

  it('is shown in the unit of the figure with two significant digits', () => {
    expect(formatChange(0.000314, height)).toBe('0.031\u00a0cm')
    expect(formatChange(-0.0314, height)).toBe('\u22123.1\u00a0cm')
    expect(formatChange(0.5, displayOf('jumpHeightImpulse', 'asymmetry'))).toBe('0.50\u00a0%')
    expect(formatChange(null, height)).toBe('–')
  })

  it('is said in multiples of the give or take, however small', () => {
    expect(formatMultiple(0.00002)).toBe('< 0.01')
    expect(formatMultiple(0.123)).toBe('0.12')
    expect(formatMultiple(12.3)).toBe('12')
    expect(formatMultiple(null)).toBe('–')
  })

  it('is named by the catalogue, and by its key where the catalogue no longer knows it', () => {
    expect(figureName('jumpHeightImpulse', 'both')).toBe('Jump height')
    expect(figureName('gone', 'left')).toBe('gone, left')
  })
})
