/** A cell of CSV: quoted where it must be, and never a formula to the program that opens it. */
export function csvCell(value: string | number | null): string {
  if (value === null) return ''
  if (typeof value === 'number') return String(value)
  // Programs take what begins so for a formula; an apostrophe in front makes it text.
  const text = /^[=+\-@\t\r\n]/u.test(value) ? `'${value}` : value
  return /[",\r\n]/u.test(text) ? `"${text.replace(/"/gu, '""')}"` : text
}

export const csvLine = (cells: readonly (string | number | null)[]): string =>
  `${cells.map(csvCell).join(',')}\r\n`
