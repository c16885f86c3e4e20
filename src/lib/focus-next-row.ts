/**
 * Before a row goes from its list: a focus inside it goes on to the first control of the row after it, or to the
 * list after the last.
 */
export function focusNextRow(row: HTMLElement | null): void {
  if (!row?.contains(document.activeElement)) return
  const next = row.nextElementSibling?.querySelector<HTMLElement>('select, button') ?? row.parentElement
  next?.focus()
}
