import { describe, expect, test } from 'vitest'
import { actKeys } from './act-keys.ts'
import { ApiError, type AnyErrorCode } from './api-error.ts'

function counted() {
  let n = 0
  return actKeys(() => `key-${(n += 1)}`)
}

describe('actKeys', () => {
  test.each<AnyErrorCode>(['no-answer', 'still-running', 'internal', 'answer-unreadable'])(
    'the same act bears the same key again after %s, when nobody knows whether it was done',
    (code) => {
      const keys = counted()
      const first = keys.keyFor({ name: 'a' })
      keys.settle(new ApiError(code, ''))
      expect(keys.keyFor({ name: 'a' })).toBe(first)
    },
  )
  test.each([null, new ApiError('stale-version', ''), new ApiError('invalid-request', '')])(
    'after a clear answer (%s) the next act is a new one',
    (error) => {
      const keys = counted()
      const first = keys.keyFor({ name: 'a' })
      keys.settle(error)
      expect(keys.keyFor({ name: 'a' })).not.toBe(first)
    },
  )
  test('a changed act bears a new key, even before an answer', () => {
    const keys = counted()
    expect(keys.keyFor({ name: 'a' })).not.toBe(keys.keyFor({ name: 'b' }))
  })
  test('keys are long enough for the server and never the same', () => {
    const [a, b] = [actKeys().keyFor(1), actKeys().keyFor(1)]
    expect(a).toMatch(/^[\w-]{16,100}$/)
    expect(a).not.toBe(b)
  })
})
