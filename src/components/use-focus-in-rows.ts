import { useLayoutEffect, useRef, type FocusEvent } from 'react'

/**
 * Keeps the focus in a list when the row that had it goes: archived, filtered away, changed by somebody else. It goes
 * on to the row that took its place, or the last one, or to what stands there instead of rows. Spread what it gives
 * into the element around the table.
 */
export function useFocusInRows() {
  const list = useRef<HTMLDivElement>(null)
  const focused = useRef<{ row: HTMLTableRowElement; place: number } | null>(null)

  useLayoutEffect(() => {
    const { current: last } = focused
    // A focus that went elsewhere by itself was let go of in `onBlur`; one whose row is gone falls to the page.
    if (last === null || last.row.isConnected || document.activeElement !== document.body) return
    focused.current = null
    const rows = list.current?.querySelectorAll('tbody tr') ?? []
    const next = rows[Math.min(last.place, rows.length - 1)] ?? list.current
    next?.querySelector<HTMLElement>('button, a')?.focus()
  })

  const onFocus = ({ target }: FocusEvent) => {
    const row = target.closest('tr')
    focused.current = row && { row, place: row.sectionRowIndex }
  }
  const onBlur = ({ relatedTarget }: FocusEvent) => {
    if (relatedTarget !== null && !list.current?.contains(relatedTarget)) focused.current = null
  }
  return { ref: list, onFocus, onBlur }
}
