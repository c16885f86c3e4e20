import { expect, test } from 'vitest'
import { mayCall } from './may-call.ts'

test('only whoever holds one of the roles may call an endpoint for roles', () => {
  expect(mayCall({ access: ['coach', 'admin'] }, ['physio', 'admin'])).toBe(true)
  expect(mayCall({ access: ['coach', 'admin'] }, ['physio'])).toBe(false)
  expect(mayCall({ access: ['coach'] }, [])).toBe(false)
})

test('an endpoint for everybody needs no role', () => {
  expect(mayCall({ access: 'public' }, [])).toBe(true)
  expect(mayCall({ access: 'signed-in' }, ['athlete'])).toBe(true)
})
