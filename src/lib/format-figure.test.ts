import { describe, expect, test } from 'vitest'
import { formatNumber, formatUncertainty, formatValue } from './format-figure.ts'

const cm = { unit: 'cm', factor: 100, decimals: 1 }

describe('formatNumber(value, decimals)', () => {
  test.each([
    [35.04, 1, '35.0'],
    [-108.4, 1, '−108.4'],
    [-0.04, 1, '0.0'],
    [868.94, 1, '868.9'],
    [2604, 0, '2\u202f604'],
    [12604.4, 0, '12\u202f604'],
    [1234567.8, 1, '1\u202f234\u202f567.8'],
  ])('%d with %d decimals is %s', (value, decimals, text) => {
    expect(formatNumber(value, decimals)).toBe(text)
  })
})

describe('formatValue(value, display)', () => {
  test('turns metres into centimetres', () => {
    expect(formatValue(0.3504, cm)).toBe('35.0')
  })
})

describe('formatUncertainty(U, display)', () => {
  test('is rounded up, never smaller than it is', () => {
    expect(formatUncertainty(0.00412, cm)).toBe('±\u00a00.5')
  })
  test('an exact step stays what it is', () => {
    expect(formatUncertainty(0.004, cm)).toBe('±\u00a00.4')
  })
  test('is never shown as nothing', () => {
    expect(formatUncertainty(1e-9, cm)).toBe('±\u00a00.1')
  })
  test('is null where there is none: a count is exact', () => {
    expect(formatUncertainty(0, cm)).toBeNull()
  })
  test('is null where none is known', () => {
    expect(formatUncertainty(null, cm)).toBeNull()
  })
})
