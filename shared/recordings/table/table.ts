import type { TableFormat } from '../format.ts'

/** What a cell's text is: a number, a time of day, nothing (or a word for a missing sample), or other text. */
export type CellKind = 'number' | 'clock' | 'blank' | 'text'

/** Rows at the top of a table that are looked at to find out how it is built. */
export const TOP_ROWS = 100

/** One row at the top of a table, as text. */
export interface TopRow {
  /** As written; a blank cell is ''. */
  cells: readonly string[]
  /** What each cell is in the way this table writes numbers. */
  kinds: readonly CellKind[]
  /** Line or row in the file, counted from 1. */
  line: number
}

/** Where the parts of a table stand. */
export interface Layout {
  /** Headings over the columns, rows of headings joined; empty where the table has none. */
  names: readonly string[]
  /** Units written in a row of their own, or an empty list. */
  units: readonly string[]
  /** Line of the headings, null without any. */
  headerLine: number | null
  /** Index of the first row of numbers in the top rows. */
  bodyRow: number
  /** Columns that hold numbers in most rows. */
  numeric: readonly number[]
  /** Rows above the headings. */
  preamble: readonly TopRow[]
}

/** Where a cell stands that is neither a number nor blank, and what it holds, made safe to show. */
export interface UnreadableCell {
  line: number
  column: number
  seen: string
}

/** The numbers under a table's headings. */
export interface Body {
  /** One array for each wanted column, all of one length; NaN where a cell is blank or unreadable. A time of day is in seconds. */
  columns: readonly Float64Array[]
  /** Line in the file of a row of `columns`. */
  lineOf: (row: number) => number
  firstUnreadable: UnreadableCell | null
  /** Lines of text after the last row of numbers. */
  linesAfter: { count: number; first: string }
  /** The last line was cut short and is not among the rows. */
  cutLine: boolean
  /** Some numbers held marks between thousands, or a comma that could have been one. */
  marks: 'none' | 'thousands' | 'comma-assumed'
}

/** A file's rows and columns, however the file stores them: delimited text, a sheet of a workbook. */
export interface Table {
  /** How the file is built, but for where the headings stand. */
  format: TableFormat
  /** The first rows; at most `TOP_ROWS`. */
  top: readonly TopRow[]
  /** Where headings and numbers stand in `top`; null where it holds no table of numbers. */
  layout: Layout | null
  /**
   * Reads the columns of `wanted` (ascending, counted from 0) from row `from` of `top` on, to the end of the file.
   * @throws ReadFault `corrupt-file` where a row of text stands among the numbers
   */
  numbers: (from: number, wanted: readonly number[]) => Body
}
