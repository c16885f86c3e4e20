import { describe, expect, it } from 'vitest'
import { fileNameOnly } from './file-name.ts'
import { listed, shown } from './safe-text.ts'

describe('shown', () => {
  it('replaces control, direction and zero-width characters and collapses blanks', () => {
    expect(shown('a\u0000b\u202Ec\u200B\n\t d')).toBe('a\uFFFDb\uFFFDc\uFFFD d')
  })

  it('cuts to 60 characters without splitting one', () => {
    const cut = shown('😀'.repeat(100))
    expect(Array.from(cut)).toHaveLength(60)
    expect(cut.endsWith('😀…')).toBe(true)
  })
})

describe('listed', () => {
  it('joins as a sentence does and counts what it leaves out', () => {
    expect(listed(['a'])).toBe('“a”')
    expect(listed(['a', 'b', 'c'])).toBe('“a”, “b” and “c”')
    expect(listed(['a', 'b', 'c'], 2)).toBe('“a”, “b” and 1 more')
  })
})

describe('fileNameOnly', () => {
  it.each([
    ['../../secret/jump.csv', 'jump.csv', true],
    ['C:\\data\\jump 1.csv', 'jump 1.csv', true],
    ['jump.csv', 'jump.csv', false],
    ['..', 'recording', false],
    ['folder/', 'recording', true],
    ['ju\u202Emp\u0000.csv', 'jump.csv', false],
  ])('keeps the last part of %j', (given, name, pathRemoved) => {
    expect(fileNameOnly(given)).toStrictEqual({ name, pathRemoved })
  })

  it('cuts a name of any length to 200 characters', () => {
    expect(fileNameOnly('x'.repeat(5000)).name).toHaveLength(200)
  })
})
