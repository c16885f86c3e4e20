import type { Note } from '../../mechanics/types.ts'
import { MIN_SAMPLES } from '../limits.ts'
import type { Table, TopRow } from '../table/table.ts'
import { readC3dColumns } from './c3d-columns.ts'

/**
 * The plates of a C3D file as a table: a row of headings that a column map goes by, and a sample a row.
 * @throws ReadFault for whatever the file holds that cannot be read
 */
export function c3dTable(bytes: Uint8Array): { table: Table; notes: Note[] } {
  const { processor, storage, plates, headings, columns, notes } = readC3dColumns(bytes)
  const samples = columns[0]?.length ?? 0
  const heading: TopRow = { cells: headings, kinds: headings.map(() => 'text'), line: 1 }
  const first = Array.from({ length: Math.min(samples, MIN_SAMPLES) }, (_, i): TopRow => {
    const cells = columns.map((column) => String(column[i] ?? ''))
    return { cells, kinds: cells.map(() => 'number'), line: i + 2 }
  })
  const table: Table = {
    format: { kind: 'c3d', processor, storage, plates },
    top: [heading, ...first],
    layout: {
      names: headings,
      units: [],
      headerLine: 1,
      bodyRow: 1,
      numeric: headings.map((_, index) => index),
      preamble: [],
    },
    numbers: (from, wanted) => ({
      columns: wanted.map((index) => columns[index]?.subarray(from - 1) ?? new Float64Array(0)),
      lineOf: (row) => from + row,
      firstUnreadable: null,
      linesAfter: { count: 0, first: '' },
      cutLine: false,
      marks: 'none',
    }),
  }
  return { table, notes }
}
