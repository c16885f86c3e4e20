import { ReadFault } from '../errors.ts'
import { byteOrderMarkLength } from '../file-kind.ts'
import type { FileFormat } from '../result.ts'
import { shown } from '../safe-text.ts'
import { unitOf } from './header-cell.ts'
import { cellKind, hasDecimalComma } from './numbers.ts'
import { HEAD_ROWS, bodyRun, topRows } from './rows.ts'
import type { Row, Run } from './rows.ts'

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

type Delimiter = FileFormat['delimiter']

/** A delimiter that occurs in the file, and what the top of the file looks like under it. */
interface Candidate {
  delimiter: Delimiter
  rows: Row[]
  run: Run | null
}

const HEAD_BYTES = 64 * 1024
const DELIMITERS: readonly Delimiter[] = [',', ';', '\t', '|']

/** One character a byte, so that Papa Parse's positions are byte offsets whatever the encoding. */
function oneCharacterAByte(bytes: Uint8Array): string {
  const pieces: string[] = []
  for (let at = 0; at < bytes.length; at += 8192) {
    pieces.push(String.fromCharCode(...bytes.subarray(at, at + 8192)))
  }
  return pieces.join('')
}

const utf8 = new TextDecoder('utf-8')

function asUtf8(cell: string): string {
  return utf8.decode(Uint8Array.from(cell, (character) => character.charCodeAt(0)))
}

function candidatesFor(text: string, from: number, isWhole: boolean): Candidate[] {
  const present = DELIMITERS.filter((delimiter) => text.includes(delimiter))
  return (present.length > 0 ? present : DELIMITERS.slice(0, 1)).map((delimiter) => {
    const rows = topRows(text, delimiter, from)
    // The last row looked at may be cut short.
    if (!isWhole && rows.length > 1 && rows.length < HEAD_ROWS) rows.pop()
    return { delimiter, rows, run: bodyRun(rows) }
  })
}

/** The last row above the body that holds words and no number. */
function headingRow(rows: Row[], bodyStart: number): number {
  return rows.slice(0, bodyStart).findLastIndex((row) => row.numbers === 0 && row.texts > 0)
}

const isUnitRow = (row: Row): boolean => {
  const cells = row.cells
    .map((cell) => cell.replace(/[()[\]{}<>]/gu, '').trim())
    .filter((cell) => cell !== '')
  return cells.length > 0 && cells.every((cell) => unitOf(asUtf8(cell)).family !== 'none')
}

/** A row between marks that are no comma, of numbers some of which have a decimal comma. */
function isDecimalCommaRow({ cells }: Row): boolean {
  return (
    cells.some(hasDecimalComma) && cells.every((cell) => hasDecimalComma(cell) || cellKind(cell) !== 'text')
  )
}

function refuseDecimalCommas(candidates: Candidate[]): void {
  for (const { rows, delimiter } of candidates) {
    if (delimiter === ',') continue
    const line = rows.findIndex(isDecimalCommaRow)
    if (line < 0 || rows.filter(isDecimalCommaRow).length < rows.length / 2) continue
    const seen = shown(rows[line]?.cells.find(hasDecimalComma) ?? '')
    throw new ReadFault('decimal-comma', `The numbers are written with a decimal comma: “${seen}”.`, {
      line: line + 1,
      seen,
    })
  }
}

/** A file whose numbers no delimiter makes sense of. */
function noTable(bytes: Uint8Array): ReadFault {
  const seen = shown(utf8.decode(bytes.subarray(0, 240)))
  const place = { line: 1, seen }
  return /\d/u.test(seen)
    ? new ReadFault(
        'no-header',
        `No table of numbers under headings was found; the file begins “${seen}”.`,
        place,
      )
    : new ReadFault('not-a-recording', `The file is text without numbers; it begins “${seen}”.`, place)
}

function lineBreakOf(text: string): FileFormat['lineBreak'] {
  const first = /\r\n|\n|\r/u.exec(text)?.[0]
  if (first === '\r\n') return 'CRLF'
  return first === '\r' ? 'CR' : 'LF'
}

/**
 * Finds delimiter, headings and the beginning of the numbers. Papa Parse reads the rows; the delimiter taken is
 * the one under which the most cells are numbers.
 * @throws ReadFault `not-a-recording`, `decimal-comma`, `no-header`
 */
export function readHead(bytes: Uint8Array): Head {
  const mark = byteOrderMarkLength(bytes)
  const text = oneCharacterAByte(bytes.subarray(mark, mark + HEAD_BYTES))
  const candidates = candidatesFor(text, mark, mark + text.length === bytes.length)
  refuseDecimalCommas(candidates)
  const cells = ({ run }: Candidate): number => (run ? run.length * run.columns : 0)
  const best = candidates.reduce((a, b) => (cells(b) > cells(a) ? b : a))
  if (!best.run) throw noTable(bytes.subarray(mark))
  const { rows, run, delimiter } = best
  return describeHead(rows, run, { delimiter, byteOrderMark: mark > 0, lineBreak: lineBreakOf(text) })
}

function describeHead(rows: Row[], run: Run, format: Omit<FileFormat, 'kind' | 'headerLine'>): Head {
  const last = headingRow(rows, run.start)
  const row = rows[last]
  if (!row) {
    const seen = shown(rows[0]?.cells.join(format.delimiter) ?? '')
    const sentence = `The file begins with numbers, and no headings say what they are: “${seen}”.`
    throw new ReadFault('no-header', sentence, { line: 1, seen })
  }
  const above = rows[last - 1]
  const unitsUnder = isUnitRow(row) && above !== undefined && above.numbers === 0 && above.texts > 1
  const names = (unitsUnder ? above : row).cells.map(asUtf8)
  refuseFewHeadings(names, run.columns, last + 1, format.delimiter)
  return {
    format: { kind: 'delimited', headerLine: unitsUnder ? last : last + 1, ...format },
    names,
    units: unitsUnder ? row.cells.map(asUtf8) : [],
    bodyStart: row.end,
    bodyLine: last + 2,
  }
}

/** Fewer headings than columns of numbers: under commas, the likeliest reason is that each number holds one. */
function refuseFewHeadings(names: string[], columns: number, line: number, delimiter: Delimiter): void {
  if (names.length >= columns) return
  const isComma = delimiter === ',' && names.length * 2 === columns
  const sentence = `There ${names.length === 1 ? 'is 1 heading' : `are ${names.length} headings`} over ${columns} columns of numbers.`
  throw new ReadFault(isComma ? 'decimal-comma' : 'no-header', sentence, {
    line,
    seen: shown(names.join(', ')),
  })
}
