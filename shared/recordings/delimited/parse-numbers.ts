import Papa from 'papaparse'
import { ReadFault } from '../errors.ts'
import { MAX_SAMPLES } from '../limits.ts'
import { shown } from '../safe-text.ts'
import { cellKind } from './numbers.ts'
import type { CellKind } from './numbers.ts'
import { lineEndFor } from './rows.ts'
import type { NumberColumns } from './scan-numbers.ts'

/** Rows of numbers read by Papa Parse, and what stood among and after them. */
export interface ParsedNumbers {
  columns: NumberColumns
  /** The first cell that was neither a number nor blank, in a row of numbers. */
  firstUnreadable: { line: number; column: number; seen: string } | null
  /** Lines of text after the last row of numbers. */
  linesAfter: { count: number; first: string }
}

/** As `cellKind`, and a number beyond what a double holds is no number. */
function finiteKind(text: string): CellKind {
  const kind = cellKind(text)
  return kind === 'number' && !Number.isFinite(Number(text)) ? 'text' : kind
}

/** Collects rows while Papa Parse steps through a body. */
class RowCollector {
  readonly columns: number[][]
  firstUnreadable: ParsedNumbers['firstUnreadable'] = null
  /** Rows without any number, held back: at the end they are a footer, in the middle damage. */
  private strays: { line: number; text: string }[] = []
  private line: number
  private readonly wanted: readonly number[]

  constructor(wanted: readonly number[], firstLine: number) {
    this.wanted = wanted
    this.columns = wanted.map(() => [])
    this.line = firstLine - 1
  }

  get rows(): number {
    return this.columns[0]?.length ?? 0
  }

  get linesAfter(): ParsedNumbers['linesAfter'] {
    return { count: this.strays.length, first: this.strays[0]?.text ?? '' }
  }

  take(cells: string[]): void {
    this.line++
    if (cells.length === 1 && (cells[0] === '' || cells[0] === '\r')) return
    const texts = this.wanted.map((index) => (cells[index] ?? '').trim())
    const kinds = texts.map(finiteKind)
    if (!kinds.includes('number') && cells.some((cell) => cellKind(cell) === 'text')) {
      this.strays.push({ line: this.line, text: cells.join(' ') })
      return
    }
    this.refuseStrays()
    kinds.forEach((kind, i) => {
      const text = texts[i] ?? ''
      this.columns[i]?.push(kind === 'number' ? Number(text) : NaN)
      if (kind === 'text')
        this.firstUnreadable ??= { line: this.line, column: (this.wanted[i] ?? 0) + 1, seen: shown(text) }
    })
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
 * Reads the wanted columns of a body that is not plain: quotes, ragged rows, words for missing samples, a footer.
 * @throws ReadFault `corrupt-file` where a line of text stands among the numbers
 */
export function parseNumbers(
  bytes: Uint8Array,
  start: number,
  delimiter: string,
  wanted: readonly number[],
  firstLine: number,
): ParsedNumbers {
  const collector = new RowCollector(wanted, firstLine)
  // One character a byte is enough: numbers are ASCII, and other text is only quoted in messages.
  const text = new TextDecoder('windows-1252').decode(bytes.subarray(start))
  let fault: unknown = null
  Papa.parse<string[]>(text, {
    delimiter,
    newline: lineEndFor(text),
    step: ({ data }, parser) => {
      try {
        collector.take(data)
      } catch (error) {
        fault = error
      }
      if (fault || collector.rows > MAX_SAMPLES) parser.abort()
    },
  })
  if (fault) throw fault
  return {
    columns: collector.columns.map((column) => Float64Array.from(column)),
    firstUnreadable: collector.firstUnreadable,
    linesAfter: collector.linesAfter,
  }
}
