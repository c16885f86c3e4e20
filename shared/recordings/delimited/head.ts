import Papa from 'papaparse'
import { ReadFault } from '../errors.ts'
import { byteOrderMarkLength } from '../file-kind.ts'
import type { FileFormat } from '../result.ts'
import { shown } from '../safe-text.ts'
import { unitOf } from './header-cell.ts'
import { cellKind, hasDecimalComma } from './numbers.ts'

/** The top of a delimited file: how it is built, its headings, and where the numbers begin. */
export interface Head {
  format: FileFormat
  /** Column headings as written. */
  names: string[]
  /** Units written in a row of their own under the headings, or an empty list. */
  units: string[]
  /** Offset of the first byte of the body. */
  bodyStart: number
  /** Line of the first row of the body, counted from 1. */
  bodyLine: number
}

const HEAD_BYTES = 64 * 1024
const HEAD_ROWS = 100
const DELIMITERS = [',', ';', '\t', '|'] as const

interface Row {
  cells: string[]
  /** Offset of the byte after the row. */
  end: number
  numbers: number
  texts: number
}

/** One character a byte, so that Papa Parse's positions are byte offsets whatever the encoding. */
function oneCharacterAByte(bytes: Uint8Array): string {
  const pieces: string[] = []
  for (let at = 0; at < bytes.length; at += 8192)
    pieces.push(String.fromCharCode(...bytes.subarray(at, at + 8192)))
  return pieces.join('')
}

const utf8 = new TextDecoder('utf-8')

function asUtf8(cell: string): string {
  return utf8.decode(Uint8Array.from(cell, (character) => character.charCodeAt(0)))
}

/** Line feed wherever there is one: a carriage return before it counts as a blank, so mixed line ends are no matter. */
export function lineEndFor(text: string): '\n' | '\r' {
  return text.includes('\n') ? '\n' : '\r'
}

function rowsOf(text: string, delimiter: string, from: number): Row[] {
  const rows: Row[] = []
  Papa.parse<string[]>(text, {
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

/** The longest stretch of rows of numbers with one count of cells: the body, or as much of it as was looked at. */
function longestRun(rows: Row[]): { start: number; length: number; columns: number } {
  let best = { start: -1, length: 0, columns: 0 }
  for (let start = 0; start < rows.length; start++) {
    if (!isData(rows[start])) continue
    const width = rows[start]?.cells.length
    let end = start + 1
    while (end < rows.length && isData(rows[end]) && rows[end]?.cells.length === width) end++
    if (end - start > best.length) best = { start, length: end - start, columns: rows[start]?.numbers ?? 0 }
    start = end - 1
  }
  return best
}

/** The last row above the body that holds words and no number. */
function headingRow(rows: Row[], bodyStart: number): number {
  for (let i = bodyStart - 1; i >= 0; i--) {
    const row = rows[i]
    if (row && row.numbers === 0 && row.texts > 0) return i
  }
  return -1
}

const isUnitRow = (row: Row): boolean => {
  const filled = row.cells
    .map((cell) => cell.replace(/[()[\]{}<>]/gu, '').trim())
    .filter((cell) => cell !== '')
  return filled.length > 0 && filled.every((cell) => unitOf(asUtf8(cell)).family !== 'none')
}

/** A file whose numbers no delimiter makes sense of: say the likeliest reason. */
function noNumbers(candidates: { rows: Row[] }[], bytes: Uint8Array): ReadFault {
  for (const { rows } of candidates) {
    const line = rows.findIndex((row) => row.cells.length > 1 && row.cells.filter(hasDecimalComma).length > 0)
    const seen = shown(rows[line]?.cells.find(hasDecimalComma) ?? '')
    if (line >= 0)
      return new ReadFault('decimal-comma', `The numbers are written with a decimal comma: “${seen}”.`, {
        line: line + 1,
        seen,
      })
  }
  const seen = shown(utf8.decode(bytes.subarray(0, 240)))
  if (/\d/u.test(seen))
    return new ReadFault(
      'no-header',
      `No table of numbers under headings was found; the file begins “${seen}”.`,
      { line: 1, seen },
    )
  return new ReadFault('not-a-recording', `The file is text without numbers; it begins “${seen}”.`, {
    line: 1,
    seen,
  })
}

function lineBreakOf(text: string): FileFormat['lineBreak'] {
  const first = /\r\n|\n|\r/u.exec(text)?.[0]
  if (first === '\r\n') return 'CRLF'
  return first === '\r' ? 'CR' : 'LF'
}

/**
 * Finds delimiter, headings and the beginning of the numbers. Papa Parse reads the rows; the delimiter taken is
 * the one under which the most rows, and among those the most columns, are numbers.
 * @throws ReadFault `not-a-recording`, `decimal-comma`, `no-header`, `too-few-samples`
 */
export function readHead(bytes: Uint8Array): Head {
  const mark = byteOrderMarkLength(bytes)
  const window = bytes.subarray(mark, mark + HEAD_BYTES)
  const text = oneCharacterAByte(window)
  const present = DELIMITERS.filter((delimiter) => text.includes(delimiter))
  const candidates = (present.length > 0 ? present : DELIMITERS.slice(0, 1)).map((delimiter) => {
    const rows = rowsOf(text, delimiter, mark)
    // The window's last row may be cut short.
    if (mark + window.length < bytes.length && rows.length > 1 && rows.length < HEAD_ROWS) rows.pop()
    return { delimiter, rows, run: longestRun(rows) }
  })
  const best = candidates.reduce((a, b) =>
    b.run.length * b.run.columns > a.run.length * a.run.columns ? b : a,
  )
  const { rows, run, delimiter } = best
  if (run.length === 0) throw noNumbers(candidates, bytes.subarray(mark))
  return describeHead(rows, run.start, { delimiter, byteOrderMark: mark > 0, lineBreak: lineBreakOf(text) })
}

function describeHead(rows: Row[], runStart: number, format: Omit<FileFormat, 'kind' | 'headerLine'>): Head {
  const last = headingRow(rows, runStart)
  const row = rows[last]
  if (!row) {
    const seen = shown(rows[0]?.cells.join(format.delimiter) ?? '')
    throw new ReadFault(
      'no-header',
      `The file begins with numbers, and no headings say what they are: “${seen}”.`,
      { line: 1, seen },
    )
  }
  const above = rows[last - 1]
  const unitsUnder = isUnitRow(row) && above !== undefined && above.numbers === 0 && above.texts > 1
  const names = (unitsUnder ? above : row).cells.map(asUtf8)
  const width = rows[runStart]?.cells.length ?? 0
  if (names.length < width - 1) {
    const sentence = `There are ${names.length} headings over ${width} columns of numbers.`
    const decimalComma = format.delimiter === ',' && names.length * 2 === width
    throw new ReadFault(decimalComma ? 'decimal-comma' : 'no-header', sentence, {
      line: last + 1,
      seen: shown(names.join(', ')),
    })
  }
  return {
    format: { kind: 'delimited', headerLine: unitsUnder ? last : last + 1, ...format },
    names,
    units: unitsUnder ? row.cells.map(asUtf8) : [],
    bodyStart: row.end,
    bodyLine: last + 2,
  }
}
