/** What a number stands for under its cell's format. */
export type NumberKind = 'number' | 'date' | 'time' | 'date-time'

/** Built-in formats that are dates or times (ECMA-376 Part 1, 18.8.30); the other built-in ones are numbers. */
const BUILT_IN: Record<number, NumberKind> = {
  14: 'date',
  15: 'date',
  16: 'date',
  17: 'date',
  18: 'time',
  19: 'time',
  20: 'time',
  21: 'time',
  22: 'date-time',
  45: 'time',
  46: 'time',
  47: 'time',
}

/** First custom number of a format. */
const FIRST_CUSTOM = 164

/** A format without what it writes as it stands: quoted, escaped, padded, coloured. */
function bare(code: string): string {
  const [first = ''] = code.split(';')
  return first
    .replace(/"[^"]*"/gu, '')
    .replace(/[\\_*]./gu, '')
    .replace(/\[(h+|m+|s+)\]/giu, '$1')
    .replace(/\[[^\]]*\]/gu, '')
    .replace(/AM\/PM|A\/P/giu, '')
    .toLowerCase()
}

function customKind(code: string): NumberKind {
  const letters = bare(code)
  if (!/^[ymdhs.,:/\s0-]*$/u.test(letters)) return 'number'
  const hasTime = /[hs]/u.test(letters)
  const hasDate = /[yd]/u.test(letters) || (!hasTime && letters.includes('m'))
  if (hasDate) return hasTime ? 'date-time' : 'date'
  return hasTime ? 'time' : 'number'
}

/** What numbers under a format are; `code` is the workbook's own text of it, if it has one. */
export function numberKind(id: number, code: string | undefined): NumberKind {
  if (code === undefined) return id < FIRST_CUSTOM ? (BUILT_IN[id] ?? 'number') : 'number'
  return customKind(code.slice(0, 255))
}
