import Papa from 'papaparse'
import { ReadFault } from '../errors.ts'
import { MAX_SAMPLES } from '../limits.ts'
import { shown } from '../safe-text.ts'
import { cellKind, hasThousands, readClock, readNumber } from '../table/number-text.ts'
import type { DecimalMark } from '../table/number-text.ts'
import type { Body, UnreadableCell } from '../table/table.ts'
import { lineEndFor, splitAtBlanks } from './lines.ts'
import type { PlainStyle } from './scan-numbers.ts'

/**
 * Collects the numbers of rows of cells, whatever took the rows apart: words for missing samples, ragged rows, marks
 * between thousands, times of day, a footer.
 */
export class RowCollector {
  private readonly columns: number[][]
  private readonly lines: number[] = []
  private firstUnreadable: UnreadableCell | null = null
  private thousands = false
  /** Rows without any number, held back: at the end they are a footer, in the middle damage. */
  private strays: { line: number; text: string }[] = []
  private strayCount = 0
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
    if (values.every(Number.isNaN) && cells.some((cell) => this.isText(cell))) {
      this.strayCount++
      if (this.strays.length === 0) this.strays.push({ line, text: cells.join(' ') })
      return
    }
    this.refuseStrays()
    this.lines.push(line)
    values.forEach((value, i) => {
      this.columns[i]?.push(value)
      if (Number.isNaN(value))
        this.noteUnreadable(cells[this.wanted[i] ?? -1] ?? '', line, this.wanted[i] ?? 0)
    })
  }

  body(): Pick<Body, 'columns' | 'lineOf' | 'firstUnreadable' | 'linesAfter'> & { thousands: boolean } {
    const { lines } = this
    return {
      columns: this.columns.map((column) => Float64Array.from(column)),
      lineOf: (row) => lines[row] ?? 0,
      firstUnreadable: this.firstUnreadable,
      linesAfter: { count: this.strayCount, first: this.strays[0]?.text ?? '' },
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

  private refuseStrays(): void {
    const [stray] = this.strays
    if (!stray) return
    const seen = shown(stray.text)
    throw new ReadFault(
      'corrupt-file',
      `Line ${stray.line} stands among the numbers and holds none: “${seen}”.`,
      { line: stray.line, seen },
    )
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
  Papa.parse<string[]>(delimiter === ' ' ? splitAtBlanks(text) : text, {
    delimiter,
    newline: lineEndFor(text),
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
