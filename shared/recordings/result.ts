import type { ForceChannel, Note, Recording } from '../mechanics/types.ts'
import type { ReadError } from './errors.ts'

export type TimeUnit = 's' | 'ms'
export type ForceUnit = 'N' | 'kN'

/** What somebody who knows the file says of it. It wins over nothing that the file itself says. */
export interface ReadHints {
  /** Hz, for a file without a time column. */
  sampleRateHz?: number
}

/** One column of the file as it was taken. `index` counts from 0; `name` is the heading as written. */
export interface MappedColumn {
  index: number
  name: string
}

/** How the columns of one kind of file are read. */
export interface ColumnMap {
  /** null: the rate came from a hint. */
  time: (MappedColumn & { unit: TimeUnit }) | null
  forces: (MappedColumn & { unit: ForceUnit; channel: ForceChannel })[]
}

/** How the file's text is built. */
export interface FileFormat {
  kind: 'delimited'
  delimiter: ',' | ';' | '\t' | '|'
  /** Line of the column headings, counted from 1. */
  headerLine: number
  byteOrderMark: boolean
  lineBreak: 'LF' | 'CRLF' | 'CR'
}

export interface ReadSuccess {
  ok: true
  recording: Recording
  columnMap: ColumnMap
  format: FileFormat
  /** The recording's notes: what was assumed, corrected or left out while reading. */
  notes: Note[]
}

export interface ReadFailure {
  ok: false
  error: ReadError
}

export type ReadResult = ReadSuccess | ReadFailure
