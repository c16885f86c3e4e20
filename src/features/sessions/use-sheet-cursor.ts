import { useRef, useState, type FocusEvent, type KeyboardEvent } from 'react'
import { moveCell, type CellPlace } from './move-cell.ts'

const place = (row: number, column: number) => `${row}/${column}`

/**
 * The sheet's cells as one stop of the Tab key: arrows move the focus among trials, and the one focused last is
 * where Tab comes back to.
 */
export function useSheetCursor(lengths: readonly number[]) {
  const [cell, setCell] = useState<CellPlace | null>(null)
  const cells = useRef(new Map<string, HTMLElement>())
  const firstRow = lengths.findIndex((length) => length > 0)
  const stands = cell !== null && cell.column < (lengths[cell.row] ?? 0)
  const current = stands ? cell : { row: firstRow, column: 0 }

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.altKey || event.metaKey) return
    const next = moveCell(event.key, current, lengths)
    if (next === null) return
    event.preventDefault()
    cells.current.get(place(next.row, next.column))?.focus()
  }
  const cellProps = (row: number, column: number) => ({
    tabIndex: row === current.row && column === current.column ? 0 : -1,
    ref: (element: HTMLElement | null) => {
      if (element) cells.current.set(place(row, column), element)
      else cells.current.delete(place(row, column))
    },
    onFocus: (_event: FocusEvent) => setCell({ row, column }),
  })
  return { onKeyDown, cellProps }
}
export type SheetCursor = ReturnType<typeof useSheetCursor>
