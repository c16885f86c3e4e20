import { MAX_WORKBOOK_CELLS } from '../archive-limits.ts'
import { ReadFault } from '../errors.ts'
import { dayNumberText } from './dates.ts'
import type { WorkbookParts } from './parts.ts'
import { readXml } from './xml.ts'

/** A number, text (a date or a time of day as text, too), or nothing. */
export type Cell = string | number | null

export interface SheetRows {
  /** From row 1 on, missing rows as empty ones. */
  rows: Cell[][]
  /** Formulas that the file holds no result of: their cells are blank. */
  formulasWithoutResult: number
}

/** The most rows and columns that a sheet can have (ECMA-376 as every program has it). */
const MOST_ROWS = 1_048_576
const MOST_COLUMNS = 16_384

const A = 'A'.charCodeAt(0)

/** `B5` → column 1, row 4, counted from 0; null for what is no place of a sheet. */
export function placeOf(reference: string): { column: number; row: number } | null {
  const match = /^\$?([A-Z]{1,3})\$?(\d{1,7})$/u.exec(reference)
  if (!match) return null
  const [, letters = '', digits = ''] = match
  const column = [...letters].reduce((sum, letter) => sum * 26 + letter.charCodeAt(0) - A + 1, 0) - 1
  const row = Number(digits) - 1
  return row >= 0 && row < MOST_ROWS && column < MOST_COLUMNS ? { column, row } : null
}

interface Merge {
  row: number
  from: number
  to: number
}

function mergeOf(reference: string): Merge | null {
  const [start, end] = reference.split(':').map((corner) => placeOf(corner))
  return start && end && end.column > start.column
    ? { row: start.row, from: start.column, to: end.column }
    : null
}

/** Collects the cells of one sheet as its XML goes by. */
class SheetCollector {
  readonly rows: Cell[][] = []
  formulasWithoutResult = 0
  readonly merges: Merge[] = []
  private readonly parts: Pick<WorkbookParts, 'strings' | 'styles' | 'is1904'>
  private readonly part: string
  private row = -1
  private column = -1
  private cells = 0
  private type = 'n'
  private style = 0
  private value = ''
  private hasFormula = false
  /** Text of `v` and of the `t` of an inline text counts; that of a formula does not. */
  private inValue = false

  constructor(parts: Pick<WorkbookParts, 'strings' | 'styles' | 'is1904'>, part: string) {
    this.parts = parts
    this.part = part
  }

  open(name: string, attributes: Record<string, string>): void {
    if (name === 'c') this.openCell(attributes)
    else if (name === 'v' || name === 't') this.inValue = true
    else if (name === 'f') this.hasFormula = true
    else if (name === 'row') this.openRow(attributes['r'])
    else if (name === 'mergeCell') {
      const merge = mergeOf(attributes['ref'] ?? '')
      if (merge) this.merges.push(merge)
    }
  }

  text(piece: string): void {
    if (this.inValue) this.value += piece
  }

  close(name: string): void {
    if (name === 'v' || name === 't') this.inValue = false
    else if (name === 'c') this.keep()
  }

  /** A row that does not say its number follows the one before it. */
  private openRow(number: string | undefined): void {
    const row = number === undefined ? this.row + 1 : Number(number) - 1
    if (!(row > this.row && row < MOST_ROWS)) throw this.misplaced(`row ${number ?? this.row + 2}`)
    this.count(row - this.row)
    while (this.rows.length <= row) this.rows.push([])
    this.row = row
    this.column = -1
  }

  private openCell({ r, t, s }: Record<string, string>): void {
    const place = r === undefined ? { row: this.row, column: this.column + 1 } : placeOf(r)
    if (place?.row !== this.row || place.column <= this.column) throw this.misplaced(`cell ${r ?? ''}`)
    this.count(place.column - this.column)
    this.column = place.column
    this.type = t ?? 'n'
    this.style = Number(s ?? 0)
    this.value = ''
    this.hasFormula = false
  }

  /** Blanks up to a cell far out count as cells: they take room as cells do. */
  private count(cells: number): void {
    this.cells += cells
    if (this.cells <= MAX_WORKBOOK_CELLS) return
    const most = MAX_WORKBOOK_CELLS.toLocaleString('en-GB')
    throw new ReadFault(
      'too-large',
      `A sheet of the workbook has more than ${most} cells, the most that is read.`,
    )
  }

  private misplaced(what: string): ReadFault {
    return new ReadFault(
      'corrupt-file',
      `The workbook is damaged: ${what} of “${this.part}” stands where none can.`,
    )
  }

  private keep(): void {
    const cell = this.cellOf()
    if (this.hasFormula && cell === null && this.type !== 'e') this.formulasWithoutResult++
    if (cell === null) return
    const cells = this.rows[this.row] ?? []
    while (cells.length < this.column) cells.push(null)
    cells.push(cell)
  }

  private cellOf(): Cell {
    const { type, value } = this
    if (value === '' || type === 'e') return null
    if (type === 's') return this.parts.strings[Number(value)] ?? null
    if (type !== 'n') return type === 'b' ? (value === '1' ? 'TRUE' : 'FALSE') : value
    const number = Number(value)
    if (!Number.isFinite(number)) return value
    const kind = this.parts.styles[this.style] ?? 'number'
    return kind === 'number' ? number : dayNumberText(number, kind, this.parts.is1904)
  }
}

/**
 * A heading over several columns stands in the first of its merged cells only; here it stands over each of them. A
 * title alone in its row stays where it is.
 */
function spreadHeadings(rows: Cell[][], merges: readonly Merge[]): void {
  for (const { row, from, to } of merges) {
    const cells = rows[row]
    const text = cells?.[from]
    if (!cells || typeof text !== 'string' || cells.filter((cell) => cell !== null).length < 2) continue
    // No wider than the row's own cells, or a merge out to the last column would make thousands of headings.
    const end = Math.min(to, Math.max(...rows.slice(row, row + 12).map(({ length }) => length)) - 1)
    while (cells.length <= end) cells.push(null)
    for (let column = from + 1; column <= end; column++) cells[column] ??= text
  }
}

/**
 * The cells of one sheet: numbers as numbers, results of formulas as the file keeps them, dates and times of day as
 * text.
 * @throws ReadFault `corrupt-file`, `too-large`
 */
export function readSheet(
  bytes: Uint8Array,
  part: string,
  parts: Pick<WorkbookParts, 'strings' | 'styles' | 'is1904'>,
): SheetRows {
  const collector = new SheetCollector(parts, part)
  readXml(bytes, part, {
    open: (name, attributes) => collector.open(name, attributes),
    text: (piece) => collector.text(piece),
    close: (name) => collector.close(name),
  })
  const { rows, merges, formulasWithoutResult } = collector
  spreadHeadings(rows, merges)
  return { rows, formulasWithoutResult }
}
