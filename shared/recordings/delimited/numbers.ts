/** The numbers both readers of a body accept: decimal point, optional exponent, nothing else. */
const NUMBER = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/u

/** Ways in which exports write that a sample is missing. */
const MISSING = new Set(['', 'nan', 'na', 'n/a', '#n/a', 'null', 'none', '-', '--'])

export type CellKind = 'number' | 'blank' | 'text'

export function cellKind(cell: string): CellKind {
  const text = cell.trim()
  if (NUMBER.test(text)) return 'number'
  return MISSING.has(text.toLowerCase()) ? 'blank' : 'text'
}

/** 12,5 or -0,001: a number as written with a decimal comma. */
export function hasDecimalComma(cell: string): boolean {
  return /^[+-]?\d+,\d+(?:[eE][+-]?\d+)?$/u.test(cell.trim())
}
