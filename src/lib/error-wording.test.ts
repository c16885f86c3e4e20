import { expect, test } from 'vitest'
import { errorCodes } from '../../shared/contracts/errors.ts'
import { ApiError } from '../api/api-error.ts'
import { errorWording, wordingOf } from './error-wording.ts'

test.each(errorCodes)('%s says what happened and what to do', (code) => {
  const { title, advice } = errorWording[code]
  expect(title).toMatch(/^[A-Z].*[^.]$/)
  expect(advice).toMatch(/^[A-Z].*\.$/)
})

test('an error that nobody foresaw is worded as our own fault', () => {
  expect(wordingOf(new TypeError('x is not a function'))).toBe(errorWording.internal)
  expect(wordingOf(new ApiError('name-taken', 'Taken.'))).toBe(errorWording['name-taken'])
})
