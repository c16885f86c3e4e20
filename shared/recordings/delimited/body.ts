import type { ReadError } from '../errors.ts'
import type { Head } from './head.ts'
import { parseNumbers } from './parse-numbers.ts'
import { scanNumbers } from './scan-numbers.ts'
import type { NumberColumns } from './scan-numbers.ts'

/** The numbers of a file's body, whichever reader read them. */
export interface Body {
  columns: NumberColumns
  /** Picks the column of a file's column index out of `columns`. */
  columnOf: (index: number, columns: NumberColumns) => Float64Array
  firstUnreadable: Required<Pick<ReadError, 'line' | 'column' | 'seen'>> | null
  linesAfter: { count: number; first: string }
}

/** Reads the columns at `indices` by the byte scanner, or by Papa Parse where the body is not plain numbers. */
export function readBody(bytes: Uint8Array, head: Head, indices: readonly number[]): Body {
  const wanted = [...new Set(indices)].sort((a, b) => a - b)
  const columnOf: Body['columnOf'] = (index, columns) => columns[wanted.indexOf(index)] ?? new Float64Array(0)
  const plain = scanNumbers(bytes, head.bodyStart, head.format.delimiter, wanted)
  if (plain) return { columns: plain, columnOf, firstUnreadable: null, linesAfter: { count: 0, first: '' } }
  return { columnOf, ...parseNumbers(bytes, head.bodyStart, head.format.delimiter, wanted, head.bodyLine) }
}
