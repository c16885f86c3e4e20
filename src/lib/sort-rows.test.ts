import { describe, expect, test } from 'vitest'
import { compareNumbers, compareText, formatSort, parseSort, sortRows } from './sort-rows.ts'

const columns = [{ key: 'name', compare: compareText }, { key: 'squads' }]

describe('sortRows(rows, columns, sort)', () => {
  test('sorts by the named column, up or down, and leaves the rows it was given alone', () => {
    const rows = ['Tomas', 'Ana', 'Łucja']
    expect(sortRows(rows, columns, parseSort('name'))).toEqual(['Ana', 'Łucja', 'Tomas'])
    expect(sortRows(rows, columns, parseSort('-name'))).toEqual(['Tomas', 'Łucja', 'Ana'])
    expect(rows).toEqual(['Tomas', 'Ana', 'Łucja'])
  })
  test.each(['squads', 'nothing', ''])('a sort that no column offers (%s) leaves the order', (sort) => {
    expect(sortRows(['b', 'a'], columns, parseSort(sort))).toEqual(['b', 'a'])
  })
})

test('a sort survives the address', () => {
  expect(formatSort(parseSort('-name'))).toBe('-name')
  expect(formatSort(parseSort('name'))).toBe('name')
})

test('text with numbers in it sorts by the numbers', () => {
  expect(['U19', 'U9', 'u12'].sort(compareText)).toEqual(['U9', 'u12', 'U19'])
})

test('what is not known goes after every number', () => {
  expect([null, 3, -1, null, 0].sort(compareNumbers)).toEqual([-1, 0, 3, null, null])
})
