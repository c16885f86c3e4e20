import { describe, expect, test } from 'vitest'
import { changedValues } from './changed-values.ts'

describe('changedValues(opened, values)', () => {
  test('holds only what differs', () => {
    expect(changedValues({ name: 'a', mass: 70 }, { name: 'a', mass: 71 })).toEqual({ mass: 71 })
  })
  test('keeps a value that was emptied', () => {
    expect(changedValues<{ mass: number | null }>({ mass: 70 }, { mass: null })).toEqual({ mass: null })
  })
  test('a list in another order is the same list', () => {
    expect(changedValues({ squads: ['a', 'b'] }, { squads: ['b', 'a'] })).toEqual({})
    expect(changedValues({ squads: ['a', 'b'] }, { squads: ['b'] })).toEqual({ squads: ['b'] })
  })
  test('is empty where nothing changed', () => {
    expect(changedValues({ name: 'a' }, { name: 'a' })).toEqual({})
  })
})
