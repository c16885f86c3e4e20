import type { ReactNode } from 'react'
import { formatSort, parseSort } from '../lib/sort-rows.ts'
import { SelectField } from './field.tsx'
import type { Column } from './table.tsx'

/** The controls over a list: search, filters, and how many are shown. */
export function ListBar({ children, count }: { children: ReactNode; count: string }) {
  return (
    <div className="no-print grid grid-cols-2 items-end gap-x-4 gap-y-3 pb-4 *:first:col-span-2 sm:flex sm:flex-wrap">
      {children}
      <p role="status" className="ms-auto text-ink-2 max-sm:col-start-2">
        {count}
      </p>
    </div>
  )
}

interface SortFieldProps<Row> {
  columns: Column<Row>[]
  value: string
  onChange: (value: string) => void
}

/** Sorting on a phone, where the table has no heads to press. */
export function SortField<Row>({ columns, value, onChange }: SortFieldProps<Row>) {
  const sortable = columns.filter((column) => column.compare !== undefined)
  return (
    <SelectField
      label="Sort by"
      className="sm:hidden"
      value={value}
      onChange={(event) => onChange(event.target.value)}
    >
      {sortable.flatMap((column) => [
        <option key={column.key} value={column.key}>
          {column.head}
        </option>,
        <option key={`-${column.key}`} value={formatSort({ ...parseSort(column.key), descending: true })}>
          {column.head}, reversed
        </option>,
      ])}
    </SelectField>
  )
}
