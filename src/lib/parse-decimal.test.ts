import { expect, test } from 'vitest'
import { parseDecimal } from './parse-decimal.ts'

test.each([
  ['74.5', 74.5],
  ['74,5', 74.5],
  [' 74 ', 74],
  ['-1,5', -1.5],
  [',5', 0.5],
  ['', null],
  ['  ', null],
  [null, null],
  [undefined, null],
  [4.5, 4.5],
])('parseDecimal(%j) is %j', (typed, value) => {
  expect(parseDecimal(typed)).toBe(value)
})

test.each(['four', '1,000.5', '1e3', '7 4', '.', '-', '12kg'])(
  'parseDecimal(%j) is not a number',
  (typed) => {
    expect(parseDecimal(typed)).toBeNaN()
  },
)
