import { describe, expect, it } from 'vitest'
import { csvLine } from './csv.ts'
import { distinctPaths, safeName } from './entry-names.ts'

describe('a name in an archive', () => {
  it.each([
    ['mara 1.csv', 'mara 1.csv'],
    ['../../etc/passwd', '.._.._etc_passwd'],
    ['C:\\day\\a.csv', 'C__day_a.csv'],
    ['what?*<x>|".csv', 'what___x___.csv'],
    ['con.csv', '_con.csv'],
    ['LPT1', '_LPT1'],
    ['ends with dots...', 'ends with dots_'],
    ['a\u202egpj.csv', 'agpj.csv'],
    ['..', 'recording'],
    ['', 'recording'],
  ])('%j becomes %j', (name, safe) => {
    expect(safeName(name)).toBe(safe)
  })

  it('is given once, whatever its capitals', () => {
    const pathOf = distinctPaths()
    expect(['a.csv', 'A.CSV', 'a.csv', 'b'].map((name) => pathOf('x/', name))).toStrictEqual([
      'x/a.csv',
      'x/A (2).CSV',
      'x/a (3).csv',
      'x/b',
    ])
    expect(pathOf('y/', 'a.csv')).toBe('y/a.csv')
  })
})

describe('a line of CSV', () => {
  it('holds no formula, and quotes what would break it', () => {
    expect(csvLine(['=1+1', '+2', '-3', '@x', '\tx', 'a,b', 'say "so"', -4.5, null, 'plain'])).toBe(
      `'=1+1,'+2,'-3,'@x,'\tx,"a,b","say ""so""",-4.5,,plain\r\n`,
    )
  })
})
