import { formatSort, parseSort, sortRows } from '../lib/sort-rows.ts'
import { Button } from './button.tsx'
import { EmptyState } from './empty-state.tsx'
import { Sheet } from './sheet.tsx'
import { Table, type Column } from './table.tsx'
import { useFocusInRows } from './use-focus-in-rows.ts'

interface ListSheetProps<Row> {
  /** What the table holds, for those who cannot see it. */
  caption: string
  columns: Column<Row>[]
  /** What is left of the list after search and filters. */
  rows: Row[]
  /** As it stands in the address. */
  sort: string
  onSort: (sort: string) => void
  /** What is shown where the filters leave nothing: a sentence, and the way back. */
  none: { title: string; back: string; onBack: () => void }
}

/** The sheet of a list that can be searched, filtered and sorted. */
export function ListSheet<Row extends { id: string }>(props: ListSheetProps<Row>) {
  const { caption, columns, rows, sort, onSort, none } = props
  const order = parseSort(sort)
  const focusKept = useFocusInRows()
  return (
    <Sheet flush>
      <div {...focusKept}>
        {rows.length === 0 ? (
          <EmptyState title={none.title} action={<Button onClick={none.onBack}>{none.back}</Button>} />
        ) : (
          <Table
            caption={caption}
            columns={columns}
            rows={sortRows(rows, columns, order)}
            rowKey={({ id }) => id}
            sort={order}
            onSort={(next) => onSort(formatSort(next))}
          />
        )}
      </div>
    </Sheet>
  )
}
