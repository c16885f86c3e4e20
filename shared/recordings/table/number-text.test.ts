import { describe, expect, it } from 'vitest'
import { cellKind, numberStyleOf, readClock, readNumber } from './number-text.ts'

describe('readNumber', () => {
  it.each([
    ['812.5', '.', 812.5],
    ['812,5', ',', 812.5],
    ['1,234.5', '.', 1234.5],
    ['1.234,5', ',', 1234.5],
    ['1 234,5', ',', 1234.5],
    ['1\u202F234.5', '.', 1234.5],
    ["1'234.5", '.', 1234.5],
    ['1,234,567', '.', 1_234_567],
    ['\u221212.5', '.', -12.5],
    ['-,25', ',', -0.25],
    ['8,125E+02', ',', 812.5],
    ['0,812', '.', NaN],
    ['12,34.5', '.', NaN],
    ['812.5', ',', NaN],
    ['1e999', '.', NaN],
    ['0x10', '.', NaN],
    ['', '.', NaN],
  ] as const)('reads %j with the decimal mark %j as %d', (text, decimal, value) => {
    expect(readNumber(text, decimal)).toBe(value)
  })
})

describe('numberStyleOf', () => {
  it.each([
    [['0,001', '812,345'], ',', false],
    [['0.001', '1,234'], '.', false],
    [['0.001', '1.234'], '.', false],
    [['1.234,5', '1.234'], ',', false],
    [['1,234.5', '1,234'], '.', false],
    [['812,345', '813,250'], ',', true],
    [['12', '13'], '.', false],
    [['left, right', 'a,b'], '.', false],
  ] as const)('finds the decimal mark of %j', (cells, decimal, assumed) => {
    expect(numberStyleOf(cells)).toStrictEqual({ decimal, assumed })
  })
})

describe('readClock', () => {
  it('reads times of day, with the date where it is written', () => {
    expect(readClock('10:32:15.250')).toBe(37_935.25)
    expect(readClock('10:32:15,250')).toBe(37_935.25)
    expect(readClock('10:32')).toBe(37_920)
    expect(readClock('02:07.5')).toBe(127.5)
    expect(readClock('2026-03-01T00:00:01Z') - readClock('2026-02-28 23:59:59Z')).toBe(2)
    expect(readClock('10:72:15')).toBeNaN()
    expect(readClock('812.5')).toBeNaN()
  })
})

describe('cellKind', () => {
  it.each([
    ['12.5', 'number'],
    ['1,234.5', 'number'],
    ['12:00:01.5', 'clock'],
    ['NaN', 'blank'],
    ['#N/A', 'blank'],
    ['stance', 'text'],
    ['0,5', 'text'],
  ])('takes %j for a %s', (text, kind) => {
    expect(cellKind(text)).toBe(kind)
  })
})
