import type { ReactNode } from 'react'
import { classNames } from '../lib/class-names.ts'
import type { Sort } from '../lib/sort-rows.ts'
import { Button } from './button.tsx'

export interface Column<Row> {
  key: string
  head: string
  /** Read aloud and shown on a phone before the cell; the head where it is left out. */
  label?: string
  cell: (row: Row) => ReactNode
  /** Figures stand at the right. */
  figure?: boolean
  /** Orders the rows when its head is pressed. */
  compare?: (a: Row, b: Row) => number
  /** True where a phone need not show this cell. */
  emptyFor?: (row: Row) => boolean
}

interface TableProps<Row> {
  /** What the table holds, for those who cannot see it. */
  caption: string
  columns: Column<Row>[]
  rows: Row[]
  rowKey: (row: Row) => string
  sort?: Sort
  onSort?: (sort: Sort) => void
}

/** A sheet's table; the first column heads each row. On a phone every row becomes a block of lines. */
export function Table<Row>({ caption, columns, rows, rowKey, sort, onSort }: TableProps<Row>) {
  return (
    <table role="table" className="data-table stacks">
      <caption className="sr-only">{caption}</caption>
      <thead role="rowgroup">
        <tr role="row">
          {columns.map((column) => (
            <HeadCell key={column.key} column={column} sort={sort} onSort={onSort} />
          ))}
        </tr>
      </thead>
      <tbody role="rowgroup">
        {rows.map((row) => (
          <tr key={rowKey(row)} role="row">
            {columns.map((column, index) => (
              <BodyCell key={column.key} column={column} row={row} heads={index === 0} />
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  )
}

interface HeadCellProps<Row> {
  column: Column<Row>
  sort: Sort | undefined
  onSort: ((sort: Sort) => void) | undefined
}

function HeadCell<Row>({ column, sort, onSort }: HeadCellProps<Row>) {
  const sorted = sort?.key === column.key ? sort : null
  const direction = sorted === null ? undefined : sorted.descending ? 'descending' : 'ascending'
  return (
    <th
      role="columnheader"
      scope="col"
      aria-sort={direction}
      className={column.figure ? 'figure' : undefined}
    >
      {column.compare === undefined || onSort === undefined ? (
        column.head === '' ? (
          <span className="sr-only">{column.label}</span>
        ) : (
          column.head
        )
      ) : (
        <Button
          look="word"
          className={classNames('no-underline!', sorted !== null && 'text-ink font-semibold!')}
          onClick={() => onSort({ key: column.key, descending: sorted !== null && !sorted.descending })}
        >
          {column.head}
          <span aria-hidden="true">{sorted === null ? '' : sorted.descending ? '\u00a0↓' : '\u00a0↑'}</span>
        </Button>
      )}
    </th>
  )
}

function BodyCell<Row>({ column, row, heads }: { column: Column<Row>; row: Row; heads: boolean }) {
  const content = column.cell(row)
  if (heads) {
    return (
      <th role="rowheader" scope="row">
        {content}
      </th>
    )
  }
  return (
    <td
      role="cell"
      data-label={column.head}
      data-empty={column.emptyFor?.(row) || undefined}
      className={column.figure ? 'figure' : undefined}
    >
      {content}
    </td>
  )
}
