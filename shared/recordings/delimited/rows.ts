import Papa from 'papaparse'
import { cellKind } from './numbers.ts'

/** A row at the top of a file. Cells hold one character a byte. */
export interface Row {
  cells: string[]
  /** Offset of the byte after the row. */
  end: number
  numbers: number
  texts: number
}

/** A stretch of rows of numbers with one count of cells. */
export interface Run {
  start: number
  length: number
  /** Numbers in its first row. */
  columns: number
}

/** Rows looked at to find out how a file is built. */
export const HEAD_ROWS = 100
/** A stretch of so many rows of numbers is the body, whatever comes after it. */
const BODY_ROWS = 10

/** Line feed wherever there is one: a carriage return before it counts as a blank, so mixed line ends are no matter. */
export function lineEndFor(text: string): '\n' | '\r' {
  return text.includes('\n') ? '\n' : '\r'
}

/** The first lines of a text, a few more than are looked at: Papa Parse takes apart all that it is given. */
function firstLines(text: string): string {
  const lineEnd = lineEndFor(text)
  let end = -1
  for (let line = 0; line < HEAD_ROWS + 1; line++) {
    end = text.indexOf(lineEnd, end + 1)
    if (end < 0) return text
  }
  return text.slice(0, end + 1)
}

/** The first rows of a text of one character a byte; `from` is the offset of its first byte in the file. */
export function topRows(text: string, delimiter: string, from: number): Row[] {
  const rows: Row[] = []
  Papa.parse<string[]>(firstLines(text), {
    delimiter,
    newline: lineEndFor(text),
    preview: HEAD_ROWS,
    step: ({ data, meta }) => {
      const kinds = data.map(cellKind)
      const numbers = kinds.filter((kind) => kind === 'number').length
      const texts = kinds.filter((kind) => kind === 'text').length
      rows.push({ cells: data, end: from + meta.cursor, numbers, texts })
    },
  })
  return rows
}

const isData = (row: Row | undefined): boolean =>
  row !== undefined && row.numbers > 0 && row.texts <= row.numbers

function runsOf(rows: Row[]): Run[] {
  const runs: Run[] = []
  for (let start = 0; start < rows.length; start++) {
    const first = rows[start]
    if (!first || !isData(first)) continue
    let end = start + 1
    while (isData(rows[end]) && rows[end]?.cells.length === first.cells.length) end++
    runs.push({ start, length: end - start, columns: first.numbers })
    start = end - 1
  }
  return runs
}

/** The first stretch of numbers that is long enough to be the body, or else the longest; null without any. */
export function bodyRun(rows: Row[]): Run | null {
  const runs = runsOf(rows)
  const longest = Math.max(0, ...runs.map((run) => run.length))
  return runs.find((run) => run.length >= Math.min(longest, BODY_ROWS)) ?? null
}
