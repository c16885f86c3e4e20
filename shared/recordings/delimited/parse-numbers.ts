import Papa from 'papaparse'
import { ReadFault } from '../errors.ts'
import { MAX_SAMPLES } from '../limits.ts'
import { shown } from '../safe-text.ts'
import { cellKind, hasThousands, readClock, readNumber } from '../table/number-text.ts'
import type { DecimalMark } from '../table/number-text.ts'
import type { Body, UnreadableCell } from '../table/table.ts'
import { splitAtBlanks, withLineFeeds } from './lines.ts'
import type { PlainStyle } from './scan-numbers.ts'

interface HeldRow {
  cells: readonly (string | number)[]
  values: number[]
  line: number
  /** It holds no number at all. */
  isStray: boolean
}

/**
 * Collects the numbers of rows of cells, whatever took the rows apart: words for missing samples, ragged rows, marks
 * between thousands, times of day, a footer.
 */
export class RowCollector {
  private readonly columns: number[][]
  private readonly lines: number[] = []
  private firstUnreadable: UnreadableCell | null = null
  private thousands = false
  /** Rows that begin with words, held back: at the end they are a footer, among others damage. */
  private held: HeldRow[] = []
  private heldCount = 0
  private readonly wanted: readonly number[]
  private readonly decimal: DecimalMark

  constructor(wanted: readonly number[], decimal: DecimalMark) {
    this.wanted = wanted
    this.decimal = decimal
    this.columns = wanted.map(() => [])
  }

  get rows(): number {
    return this.lines.length
  }

  /**
   * @param cells one row; numbers as they are, text as written, nothing as ''
   * @throws ReadFault `corrupt-file` where rows of text stood before a row of numbers
   */
  take(cells: readonly (string | number)[], line: number): void {
    if (cells.every((cell) => cell === '' || cell === '\r')) return
    const values = this.wanted.map((index) => this.valueOf(cells[index] ?? ''))
    const numbers = values.filter((value) => !Number.isNaN(value)).length
    const texts = this.wanted.filter((index) => this.isText(cells[index] ?? '')).length
    const isStray = numbers === 0 && cells.some((cell) => this.isText(cell))
    if (isStray || (numbers <= texts && this.isText(cells[0] ?? ''))) {
      this.hold({ cells, values, line, isStray })
      return
    }
    this.release()
    this.keep({ cells, values, line })
  }

  body(): Pick<Body, 'columns' | 'lineOf' | 'firstUnreadable' | 'linesAfter'> & { thousands: boolean } {
    const { lines } = this
    return {
      columns: this.columns.map((column) => Float64Array.from(column)),
      lineOf: (row) => lines[row] ?? 0,
      firstUnreadable: this.firstUnreadable,
      linesAfter: { count: this.heldCount, first: this.held[0]?.cells.join(' ') ?? '' },
      thousands: this.thousands,
    }
  }

  private isText(cell: string | number): boolean {
    return typeof cell === 'string' && cellKind(cell, this.decimal) === 'text'
  }

  private valueOf(cell: string | number): number {
    if (typeof cell === 'number') return Number.isFinite(cell) ? cell : NaN
    const value = readNumber(cell, this.decimal)
    if (Number.isNaN(value)) return readClock(cell)
    if (!this.thousands && hasThousands(cell, this.decimal)) this.thousands = true
    return value
  }

  private noteUnreadable(cell: string | number, line: number, column: number): void {
    if (this.firstUnreadable || typeof cell === 'number' || cellKind(cell, this.decimal) === 'blank') return
    this.firstUnreadable = { line, column: column + 1, seen: shown(cell) }
  }

  private hold(row: HeldRow): void {
    this.heldCount++
    // After one row of words the first is all that is told of any number of them.
    if (!this.held.some(({ isStray }) => isStray)) this.held.push(row)
  }

  /** A row of numbers follows: what was held back is no footer. */
  private release(): void {
    if (this.heldCount === 0) return
    const stray = this.held.find(({ isStray }) => isStray)
    if (stray) {
      const seen = shown(stray.cells.join(' '))
      const sentence = `Line ${stray.line} stands among the numbers and holds none: “${seen}”.`
      throw new ReadFault('corrupt-file', sentence, { line: stray.line, seen })
    }
    for (const row of this.held) this.keep(row)
    this.held = []
    this.heldCount = 0
  }

  private keep({ cells, values, line }: Omit<HeldRow, 'isStray'>): void {
    this.lines.push(line)
    values.forEach((value, i) => {
      this.columns[i]?.push(value)
      if (Number.isNaN(value))
        this.noteUnreadable(cells[this.wanted[i] ?? -1] ?? '', line, this.wanted[i] ?? 0)
    })
  }
}

/**
 * Reads the wanted columns of a text that is not plain numbers.
 * @throws ReadFault `corrupt-file` where a line of text stands among the numbers
 */
export function parseNumbers(
  text: string,
  { delimiter, decimal }: PlainStyle,
  wanted: readonly number[],
  firstLine: number,
): ReturnType<RowCollector['body']> {
  const collector = new RowCollector(wanted, decimal)
  let line = firstLine - 1
  let fault: unknown = null
  const lines = withLineFeeds(text)
  Papa.parse<string[]>(delimiter === ' ' ? splitAtBlanks(lines) : lines, {
    delimiter,
    newline: '\n',
    step: ({ data }, parser) => {
      line++
      try {
        collector.take(data, line)
      } catch (error) {
        fault = error
      }
      if (fault || collector.rows > MAX_SAMPLES) parser.abort()
    },
  })
  if (fault) throw fault
  return collector.body()
}
