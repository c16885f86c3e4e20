import type { Columns } from '../columns/settle-map.ts'
import type { TablePreview } from '../result.ts'
import { shown } from '../safe-text.ts'
import type { Layout } from './table.ts'
import type { Table } from './table.ts'

/** Rows and columns of a table in little. */
const ROWS = 8
const COLUMNS = 40
/** Stretches of a mini trace. */
const STRETCHES = 120

/** Least and greatest of each stretch, so that no peak is lost; blank stretches repeat the one before. */
function traceOf(index: number, values: Float64Array): TablePreview['traces'][number] {
  const stretches = Math.min(STRETCHES, values.length)
  const trace = { index, least: [] as number[], greatest: [] as number[] }
  for (let k = 0; k < stretches; k++) {
    const from = Math.floor((k * values.length) / stretches)
    const to = Math.floor(((k + 1) * values.length) / stretches)
    let [least, greatest] = [Infinity, -Infinity]
    for (let i = from; i < to; i++) {
      const value = values[i] as number
      if (value < least) least = value
      if (value > greatest) greatest = value
    }
    trace.least.push(least <= greatest ? least : (trace.least.at(-1) ?? 0))
    trace.greatest.push(least <= greatest ? greatest : (trace.greatest.at(-1) ?? 0))
  }
  return trace
}

/** A table in little: headings, first rows as text made safe, and a mini trace of each column of numbers. */
export function previewOf(table: Table, layout: Layout, columns: Columns): TablePreview {
  const rows = table.top.slice(layout.bodyRow, layout.bodyRow + ROWS)
  const width = Math.min(COLUMNS, Math.max(columns.headings.length, ...rows.map((row) => row.cells.length)))
  const range = Array.from({ length: width }, (_, index) => index)
  return {
    headings: range.map((index) => shown(columns.headings[index]?.name ?? '')),
    rows: rows.map((row) => range.map((index) => shown(row.cells[index] ?? ''))),
    traces: columns.numeric
      .filter((index) => index < COLUMNS)
      .map((index) => traceOf(index, columns.contentOf(index).values)),
  }
}
