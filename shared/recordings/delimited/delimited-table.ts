import Papa from 'papaparse'
import { ReadFault } from '../errors.ts'
import type { DelimitedFormat } from '../format.ts'
import { shown } from '../safe-text.ts'
import { layoutOf } from '../table/layout.ts'
import type { Layout } from '../table/table.ts'
import { cellKind, numberStyleOf } from '../table/number-text.ts'
import type { NumberStyle } from '../table/number-text.ts'
import { TOP_ROWS } from '../table/table.ts'
import type { Body, Table, TopRow } from '../table/table.ts'
import { wholeLinesEnd } from './cut-line.ts'
import { decodeBytes } from './encoding.ts'
import type { DecodedBytes } from './encoding.ts'
import { splitAtBlanks, withLineFeeds } from './lines.ts'
import { parseNumbers } from './parse-numbers.ts'
import { scanNumbers } from './scan-numbers.ts'

type Delimiter = DelimitedFormat['delimiter']

interface TopLine extends TopRow {
  /** Offset of the byte after the row. */
  end: number
}

/** A delimiter that occurs in the file, and what the top of the file looks like under it. */
interface Candidate {
  delimiter: Delimiter
  style: NumberStyle
  top: TopLine[]
  layout: Layout | null
  /** How much of a table the top is. */
  score: number
  /** Headings stand over all columns of numbers: no other delimiter need be tried. */
  isClear: boolean
}

const HEAD_BYTES = 64 * 1024
const MARKS: readonly Delimiter[] = [',', ';', '\t', '|']
const LF = 0x0a
const CR = 0x0d

/** The bytes of the first lines, a few more than are looked at: Papa Parse takes apart all that it is given. */
function topBytes(bytes: Uint8Array, lines: number): { piece: Uint8Array; isWhole: boolean } {
  const head = bytes.subarray(0, HEAD_BYTES)
  const lineEnd = head.includes(LF) ? LF : CR
  let end = -1
  for (let line = 0; line <= lines; line++) {
    end = head.indexOf(lineEnd, end + 1)
    if (end < 0) return { piece: head, isWhole: head.length === bytes.length }
  }
  return { piece: head.subarray(0, end + 1), isWhole: true }
}

/** One character a byte, so that Papa Parse's positions are byte offsets whatever the encoding. */
function oneCharacterAByte(bytes: Uint8Array): string {
  const pieces: string[] = []
  for (let at = 0; at < bytes.length; at += 8192)
    pieces.push(String.fromCharCode(...bytes.subarray(at, at + 8192)))
  return pieces.join('')
}

/** Cells back in their own characters, where there are others than those of ASCII. */
function cellsIn(cells: string[], decode: DecodedBytes['decode'], isAscii: boolean): string[] {
  if (isAscii) return cells
  return cells.map((cell) => decode(Uint8Array.from(cell, (character) => character.charCodeAt(0))))
}

interface RawRow {
  cells: string[]
  end: number
}

/** Rows of cells between runs of blanks; a unit in brackets after a blank belongs to its heading. */
function rowsAtBlanks(text: string): RawRow[] {
  const rows: RawRow[] = []
  let at = 0
  while (at < text.length && rows.length < TOP_ROWS) {
    const found = text.indexOf('\n', at)
    const end = found < 0 ? text.length : found + 1
    const line = splitAtBlanks(text.slice(at, end).replace(/[\r\n]/gu, '')).replace(/ (?=[([{])/gu, '\u0000')
    rows.push({
      cells: line.split(' ').map((cell) => cell.replaceAll('\u0000', ' ').replace(/^"(.*)"$/u, '$1')),
      end,
    })
    at = end
  }
  return rows
}

function rowsAtMarks(text: string, delimiter: Delimiter): RawRow[] {
  const rows: RawRow[] = []
  Papa.parse<string[]>(text, {
    delimiter,
    newline: '\n',
    preview: TOP_ROWS,
    step: ({ data, meta }) => {
      rows.push({ cells: data, end: meta.cursor })
    },
  })
  return rows
}

/** Headings that hold blanks themselves: split at two blanks or more, where that makes as many as there are columns. */
function atWideBlanks(row: TopLine, text: string, columns: number): TopLine {
  const cells = text.trim().split(/\s{2,}|\t+/u)
  if (row.cells.length === columns || cells.length !== columns) return row
  return { ...row, cells, kinds: cells.map((cell) => cellKind(cell)) }
}

function candidateFor(
  text: string,
  delimiter: Delimiter,
  decoded: DecodedBytes,
  isWhole: boolean,
): Candidate {
  const isAscii = !/[\u0080-\u00FF]/u.test(text)
  const raw = delimiter === ' ' ? rowsAtBlanks(text) : rowsAtMarks(text, delimiter)
  // The last row looked at may be cut short.
  if (!isWhole && raw.length > 1 && raw.length < TOP_ROWS) raw.pop()
  const rows = raw.map(({ cells, end }) => ({ cells: cellsIn(cells, decoded.decode, isAscii), end }))
  const style = numberStyleOf(rows.flatMap((row) => row.cells))
  const kindsOf = (cells: string[]): TopRow['kinds'] => cells.map((cell) => cellKind(cell, style.decimal))
  let top = rows.map((row, i): TopLine => ({ ...row, kinds: kindsOf(row.cells), line: i + 1 }))
  if (delimiter === ' ') {
    const columns = layoutOf(top)?.numeric.length ?? 0
    const starts = [0, ...raw.map(({ end }) => end)]
    top = top.map((row, i) =>
      row.kinds.includes('number') ? row : atWideBlanks(row, text.slice(starts[i], row.end), columns),
    )
  }
  return { delimiter, style, top, ...judge(top, style) }
}

/** Numbers over words in the rows of the body; headings over all of its columns speak for a delimiter too. */
function judge(top: readonly TopLine[], style: NumberStyle): Pick<Candidate, 'layout' | 'score' | 'isClear'> {
  const layout = layoutOf(top)
  if (!layout) return { layout, score: -Infinity, isClear: false }
  let [numbers, texts] = [0, 0]
  for (const { kinds } of top.slice(layout.bodyRow)) {
    for (const kind of kinds) {
      if (kind === 'text') texts++
      else if (kind !== 'blank') numbers++
    }
  }
  const named = layout.names.filter((name) => name.trim() !== '').length
  const isNamed = layout.headerLine !== null && named >= layout.numeric.length
  // Words right above numbers are headings, and too few of them for a right delimiter.
  const wordsAbove = layout.preamble.findLast((row) => row.kinds.some((kind) => kind !== 'blank'))
  const isOpen = layout.headerLine === null && !wordsAbove?.kinds.includes('text')
  const share = isNamed ? 1.25 : isOpen ? 1 : 0.4
  return { layout, score: (numbers - texts) * share, isClear: isNamed && texts === 0 && !style.assumed }
}

/** The delimiter under which the top is most of a table; those that need no mark are tried where the marks leave doubt. */
function bestCandidate(text: string, decoded: DecodedBytes, isWhole: boolean): Candidate {
  const candidate = (delimiter: Delimiter): Candidate => candidateFor(text, delimiter, decoded, isWhole)
  const better = (a: Candidate, b: Candidate): Candidate => (b.score > a.score ? b : a)
  const marked = MARKS.filter((mark) => text.includes(mark)).map(candidate)
  // A semicolon that never comes makes a table of one column.
  let best = marked.reduce(better, marked[0] ?? candidate(';'))
  if (best.isClear) return best
  if (!text.includes(';')) best = better(best, candidate(';'))
  return /\d[ \t]+[-+.]?\d/u.test(text) && text.includes(' ') ? better(best, candidate(' ')) : best
}

function lineBreakOf(text: string): DelimitedFormat['lineBreak'] {
  const first = /\r\n|\n|\r/u.exec(text)?.[0]
  if (first === '\r\n') return 'CRLF'
  return first === '\r' ? 'CR' : 'LF'
}

/** Line in the file of a row of plain numbers: empty lines are none. Counted when it is asked for. */
function lineCounter(bytes: Uint8Array, start: number, firstLine: number): (row: number) => number {
  return (row) => {
    let line = firstLine
    let rows = -1
    let isEmpty = true
    for (let at = start; at < bytes.length; at++) {
      const byte = bytes[at]
      const ends = byte === LF || (byte === CR && bytes[at + 1] !== LF)
      if (ends) {
        line++
        isEmpty = true
      } else if (isEmpty && byte !== CR) {
        isEmpty = false
        if (++rows === row) return line
      }
    }
    return line
  }
}

function bodyReader(decoded: DecodedBytes, { delimiter, style, top }: Candidate): Table['numbers'] {
  return (from, wanted): Body => {
    const start = from === 0 ? 0 : (top[from - 1]?.end ?? 0)
    const firstLine = top[from]?.line ?? top.length + 1
    const plain = { delimiter, decimal: style.decimal }
    const end = wholeLinesEnd(decoded.bytes, start, plain)
    const bytes = end < decoded.bytes.length ? decoded.bytes.subarray(0, end) : decoded.bytes
    const cutLine = end < decoded.bytes.length
    const columns = scanNumbers(bytes, start, plain, wanted)
    const assumed = style.assumed ? 'comma-assumed' : 'none'
    if (columns) {
      const nothing = { firstUnreadable: null, linesAfter: { count: 0, first: '' } }
      return { columns, lineOf: lineCounter(bytes, start, firstLine), ...nothing, cutLine, marks: assumed }
    }
    const { thousands, ...parsed } = parseNumbers(
      decoded.decode(bytes.subarray(start)),
      plain,
      wanted,
      firstLine,
    )
    return { ...parsed, cutLine, marks: thousands ? 'thousands' : assumed }
  }
}

/** Rows that are enough where they are a table with its headings already: taking rows apart is slow. */
const FEW_ROWS = 16
/** Of them so many must be numbers. */
const FEW_NUMBERS = 10

/** The top of a file as a table: a few rows where they are clear, else all that are looked at. */
function topOf(decoded: DecodedBytes): { best: Candidate; text: string } {
  for (const lines of [FEW_ROWS, TOP_ROWS]) {
    const { piece, isWhole } = topBytes(decoded.bytes, lines)
    const text = oneCharacterAByte(piece)
    const best = bestCandidate(withLineFeeds(text), decoded, isWhole)
    const rows = best.top.length - (best.layout?.bodyRow ?? best.top.length)
    if (lines === TOP_ROWS || (best.isClear && rows >= FEW_NUMBERS)) return { best, text }
  }
  throw new RangeError('The top of a file is looked at twice at most.')
}

/** A file whose numbers no delimiter makes sense of. */
function noTable(decoded: DecodedBytes): ReadFault {
  const seen = shown(decoded.decode(decoded.bytes.subarray(0, 240)))
  const place = { line: 1, seen }
  return /\d/u.test(seen)
    ? new ReadFault(
        'no-header',
        `No table of numbers under headings was found; the file begins “${seen}”.`,
        place,
      )
    : new ReadFault('not-a-recording', `The file is text without numbers; it begins “${seen}”.`, place)
}

/**
 * The table in the bytes of a text. Papa Parse takes the first rows apart; the delimiter taken is the one under which
 * the most cells are numbers. Plain bodies go through the byte scanner, all others through Papa Parse.
 * @throws ReadFault `not-a-recording`, `no-header` where there is no table of numbers
 */
export function delimitedTable(file: Uint8Array): Table {
  const decoded = decodeBytes(file)
  const { best, text } = topOf(decoded)
  if (best.score === -Infinity) throw noTable(decoded)
  const { encoding, byteOrderMark } = decoded
  return {
    format: {
      kind: 'delimited',
      delimiter: best.delimiter,
      encoding,
      byteOrderMark,
      lineBreak: lineBreakOf(text),
      decimalMark: best.style.decimal,
    },
    top: best.top,
    layout: best.layout,
    numbers: bodyReader(decoded, best),
  }
}
