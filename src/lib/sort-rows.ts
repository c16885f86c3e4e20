export interface Sort {
  key: string
  descending: boolean
}

interface Sortable<Row> {
  key: string
  compare?: (a: Row, b: Row) => number
}

/** `name` or `-name` in the address. */
export function parseSort(text: string): Sort {
  return text.startsWith('-') ? { key: text.slice(1), descending: true } : { key: text, descending: false }
}

export function formatSort({ key, descending }: Sort): string {
  return descending ? `-${key}` : key
}

/** A sorted copy, by the column that the sort names; as they came where it names none. */
export function sortRows<Row>(
  rows: readonly Row[],
  columns: Sortable<Row>[],
  { key, descending }: Sort,
): Row[] {
  const compare = columns.find((column) => column.key === key)?.compare
  if (compare === undefined) return [...rows]
  return [...rows].sort((a, b) => (descending ? compare(b, a) : compare(a, b)))
}

const collator = new Intl.Collator('en', { sensitivity: 'base', numeric: true })

/** Names as people look them up: accents and case aside, "10" after "9". */
export function compareText(a: string, b: string): number {
  return collator.compare(a, b)
}

/** Numbers upward; what is not known goes last. */
export function compareNumbers(a: number | null, b: number | null): number {
  if (a === null || b === null) return a === b ? 0 : a === null ? 1 : -1
  return a - b
}
