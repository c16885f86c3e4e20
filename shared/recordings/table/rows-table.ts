import { RowCollector } from '../delimited/parse-numbers.ts'
import type { WorkbookFormat } from '../format.ts'
import { layoutOf } from './layout.ts'
import { cellKind, numberStyleOf } from './number-text.ts'
import { TOP_ROWS } from './table.ts'
import type { CellKind, Table, TopRow } from './table.ts'

/** A cell as its file holds it: text, a number, or nothing. */
export type Cell = string | number | null

/**
 * The table in the rows of a sheet.
 * @param rows all rows in order, the first row of the sheet first, missing ones empty. Times of day and dates as text
 * (`10:32:15.001`, `2026-12-01T10:32:15.001`).
 */
export function tableOfRows(
  rows: readonly (readonly Cell[])[],
  format: Omit<WorkbookFormat, 'headerLine'>,
): Table {
  const texts = rows.slice(0, TOP_ROWS).flatMap((row) => row.filter((cell) => typeof cell === 'string'))
  const style = numberStyleOf(texts)
  const kindOf = (cell: Cell): CellKind =>
    typeof cell === 'number' ? 'number' : cell === null ? 'blank' : cellKind(cell, style.decimal)
  const top = rows.slice(0, TOP_ROWS).map((row, i): TopRow => ({
    cells: row.map((cell) => (cell === null ? '' : String(cell))),
    kinds: row.map(kindOf),
    line: i + 1,
  }))
  return {
    format,
    top,
    layout: layoutOf(top),
    numbers: (from, wanted) => {
      const collector = new RowCollector(wanted, style.decimal)
      for (let at = from; at < rows.length; at++)
        collector.take(
          (rows[at] ?? []).map((cell) => cell ?? ''),
          at + 1,
        )
      const { thousands, ...body } = collector.body()
      return {
        ...body,
        cutLine: false,
        marks: thousands ? 'thousands' : style.assumed ? 'comma-assumed' : 'none',
      }
    },
  }
}
