import { unitOf } from '../columns/heading.ts'
import type { Layout, TopRow } from './table.ts'

/** A stretch of so many rows of numbers is the body, whatever comes after it. */
const BODY_ROWS = 10
/** Blank rows that may stand between headings and numbers. */
const BLANK_ROWS = 2

function numbersIn({ kinds }: TopRow): number[] {
  const numbers: number[] = []
  for (let column = 0; column < kinds.length; column++) {
    if (kinds[column] === 'number' || kinds[column] === 'clock') numbers.push(column)
  }
  return numbers
}

const textsIn = (row: TopRow): number => row.kinds.reduce((n, kind) => n + (kind === 'text' ? 1 : 0), 0)

const isBlank = (row: TopRow): boolean => row.kinds.every((kind) => kind === 'blank')

/** More numbers than words, or a number first: `Rate;1000` says something of the file, `812.5;stance` is a sample. */
function isData(row: TopRow, numbers: readonly number[]): boolean {
  if (numbers.length === 0) return false
  const first = row.kinds.findIndex((kind) => kind !== 'blank')
  return row.kinds[first] === 'text' ? numbers.length > textsIn(row) : numbers.length >= textsIn(row)
}

/** A stretch of rows of numbers. */
interface Run {
  start: number
  length: number
  numeric: number[]
}

/** Columns that hold a number in at least half of the rows. */
function numericColumns(rows: readonly TopRow[]): number[] {
  const counts: number[] = []
  for (const row of rows) for (const column of numbersIn(row)) counts[column] = (counts[column] ?? 0) + 1
  return counts.flatMap((count, column) => (count >= rows.length / 2 ? [column] : []))
}

/** Stray cells beside the table and blanks in it do not end a stretch; another set of columns does. */
function goesOn(core: readonly number[], numbers: readonly number[]): boolean {
  const shared = numbers.filter((column) => core.includes(column)).length
  return shared * 2 >= core.length && shared * 2 >= numbers.length
}

function runsOf(top: readonly TopRow[]): Run[] {
  const numbers = top.map(numbersIn)
  const runs: Run[] = []
  for (let start = 0; start < top.length; start++) {
    const row = top[start]
    const core = numbers[start]
    if (!row || !core || !isData(row, core)) continue
    let end = start + 1
    for (; end < top.length; end++) {
      const [next, its] = [top[end], numbers[end]]
      if (!next || !its || !isData(next, its) || !goesOn(core, its)) break
    }
    runs.push({ start, length: end - start, numeric: numericColumns(top.slice(start, end)) })
    start = end - 1
  }
  return runs
}

/** The first stretch of numbers that is long enough to be the body, or else the longest; null without any. */
function bodyRun(top: readonly TopRow[]): Run | null {
  const runs = runsOf(top)
  const longest = Math.max(0, ...runs.map((run) => run.length))
  const run = runs.find(({ length }) => length >= Math.min(longest, BODY_ROWS))
  if (!run) return null
  // Headings such as `Time;1;2` look like numbers until the column under a word is seen to hold some.
  const first = top[run.start]
  const isHeading = run.length > 2 && run.numeric.some((column) => first?.kinds[column] === 'text')
  return isHeading ? { ...run, start: run.start + 1, length: run.length - 1 } : run
}

/** What is written of a unit, out of its brackets. */
const bare = (cell: string): string => cell.replace(/[()[\]{}<>]/gu, '').trim()

function isUnitRow(row: TopRow): boolean {
  const cells = row.cells.map(bare).filter((cell) => cell !== '' && cell !== '-')
  return cells.length > 0 && cells.every((cell) => unitOf(cell).family !== 'none')
}

/** A row of headings over so many columns, and not a sentence or a key with its value. */
function couldHead(row: TopRow | undefined, columns: number): row is TopRow {
  if (!row || textsIn(row) === 0 || row.kinds.includes('clock')) return false
  return row.cells.length >= columns || textsIn(row) * 2 >= columns
}

/** The words over several columns (`Left`, blank, `Right`, blank) in front of each column's own. */
function joined(group: TopRow, names: readonly string[]): string[] {
  let above = ''
  return names.map((name, column) => {
    const own = group.cells[column]?.trim() ?? ''
    if (own !== '') above = own
    return `${above} ${name}`.trim()
  })
}

/** Whether a row says what a row of headings under it leaves open: the same heading twice, or none. */
function isGroup(row: TopRow | undefined, names: readonly string[]): row is TopRow {
  if (!row || textsIn(row) === 0 || row.cells.length < names.length - 1 || row.cells.length < 2) return false
  if (isUnitRow(row) || row.kinds.some((kind) => kind === 'number' || kind === 'clock')) return false
  if (row.cells.some((cell) => cell.trim().endsWith(':'))) return false
  const written = names.map((name) => name.trim().toLowerCase()).filter((name) => name !== '')
  const open = names.some((name, column) => name.trim() === '' && (row.cells[column]?.trim() ?? '') !== '')
  return open || new Set(written).size < written.length
}

interface Headings {
  names: readonly string[]
  units: readonly string[]
  /** Indices of the first and the last row of headings. */
  from: number
  to: number
}

/** One to three rows of headings whose last is row `at`: words over several columns, headings, units. */
function headingsAt(top: readonly TopRow[], at: number, columns: number): Headings | null {
  const row = top[at]
  if (!couldHead(row, columns)) return null
  const above = top[at - 1]
  const unitsUnder = isUnitRow(row) && couldHead(above, columns) && !isUnitRow(above)
  const unitsOver = !unitsUnder && above !== undefined && couldHead(above, columns) && isUnitRow(above)
  const names = (unitsUnder ? above : row).cells
  const units = unitsUnder ? row.cells : unitsOver ? above.cells : []
  const from = unitsUnder || unitsOver ? at - 1 : at
  const group = top[from - 1]
  if (isGroup(group, names)) return { names: joined(group, names), units, from: from - 1, to: at }
  return { names, units, from, to: at }
}

/** The second row above the headings that looks like those under them: then the headings stand among the numbers. */
export function numbersAbove({ preamble, numeric }: Layout): TopRow | undefined {
  const [first = 0] = numeric
  const isNumber = ({ kinds }: TopRow, column: number): boolean =>
    kinds[column] === 'number' || kinds[column] === 'clock'
  if (numeric.length < 2) return undefined
  return preamble.filter(
    (row) => isNumber(row, first) && numeric.filter((column) => isNumber(row, column)).length > 1,
  )[1]
}

/**
 * Finds headings and numbers in the rows at the top of a table.
 * @returns null where no stretch of rows holds numbers
 */
export function layoutOf(top: readonly TopRow[]): Layout | null {
  const run = bodyRun(top)
  if (!run) return null
  const columns = run.numeric.length
  let above = run.start - 1
  for (let skipped = 0; skipped < BLANK_ROWS && top[above] && isBlank(top[above] as TopRow); skipped++)
    above--
  const last = lastHeading(top, above)
  const headings = last === null ? null : headingsAt(top, last, columns)
  if (!headings) {
    const bodyRow = run.start
    return {
      names: [],
      units: [],
      headerLine: null,
      bodyRow,
      numeric: run.numeric,
      preamble: top.slice(0, bodyRow),
    }
  }
  return {
    names: headings.names,
    units: headings.units,
    headerLine:
      top[headings.to - (headings.units.length > 0 && headings.to > headings.from ? 1 : 0)]?.line ?? 1,
    bodyRow: headings.to + 1,
    numeric: run.numeric,
    preamble: top.slice(0, headings.from),
  }
}

/** The nearest row above the body that holds words and no number; rows of numbers between belong to the body. */
function lastHeading(top: readonly TopRow[], from: number): number | null {
  for (let at = from; at >= 0; at--) {
    const row = top[at]
    if (!row || isBlank(row)) continue
    if (textsIn(row) > 0 && !row.kinds.includes('number')) return at
    if (textsIn(row) > 0 && at === from && isNumbered(row)) return at
  }
  return null
}

/** Headings some of which are small whole numbers: `Time;1;2`. */
function isNumbered(row: TopRow): boolean {
  return row.cells.every((cell, i) => row.kinds[i] !== 'number' || /^\s*\d{1,2}\s*$/u.test(cell))
}
