import { describe, expect, test } from 'vitest'
import { safeReturnPath, signInPathFrom } from './paths.ts'

describe('safeReturnPath(from)', () => {
  test.each(['/athletes', '/sessions/1?x=2', '/'])('keeps a path of this site: %s', (from) => {
    expect(safeReturnPath(from)).toBe(from)
  })
  test.each([
    'https://elsewhere.example',
    '//elsewhere.example',
    '/\\elsewhere.example',
    '/\t/elsewhere.example',
    '/\n/elsewhere.example',
    '/\r\\elsewhere.example',
    'athletes',
    '',
    null,
    '/sign-in',
  ])('leads to the start instead of %s', (from) => {
    expect(safeReturnPath(from)).toBe('/')
  })
})

describe('signInPathFrom(location)', () => {
  test('carries path and query so that sign-in can lead back', () => {
    expect(signInPathFrom({ pathname: '/athletes', search: '?squad=1' })).toBe(
      '/sign-in?from=%2Fathletes%3Fsquad%3D1',
    )
  })
  test('carries nothing from the start page', () => {
    expect(signInPathFrom({ pathname: '/', search: '' })).toBe('/sign-in')
  })
})
