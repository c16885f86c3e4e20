import type { ForceChannel, Note, Recording } from '../mechanics/types.ts'
import type { MapProposal } from './columns/map-proposal.ts'
import type { ReadError } from './errors.ts'
import type { Metadata } from './table/metadata.ts'

/** Of a column of time: a length of time, the number of a sample (or of a frame of samples), or a time of day. */
export type TimeUnit = 's' | 'ms' | 'us' | 'min' | 'samples' | 'clock'
/** `kgf` and `lbf` are the weight of a kilogram and a pound under standard gravity; `BW` is the athlete's body weight. */
export type ForceUnit = 'N' | 'kN' | 'kgf' | 'lbf' | 'BW' | '%BW'

/** One column of the file as it was taken. `index` counts from 0; `name` is the heading as written. */
export interface MappedColumn {
  index: number
  name: string
}

export interface MappedTime extends MappedColumn {
  unit: TimeUnit
  /** Of `samples`: the column counts frames, and another one the samples within a frame. */
  within?: MappedColumn & { samplesPerFrame: number }
}

export interface MappedForce extends MappedColumn {
  unit: ForceUnit
  /** Columns of one channel are added up. */
  channel: ForceChannel
  /** Pressing on the plate reads negative. */
  downward?: true
}

/** How the columns of one kind of file are read: data that a person can confirm, change and keep. */
export interface ColumnMap {
  /** null: the file has no time; the rate is stated. */
  time: MappedTime | null
  forces: MappedForce[]
  /** Hz, as a person confirmed it for files that do not state it themselves. */
  sampleRateHz?: number
}

/** What somebody who knows the file says of it. It wins over nothing that the file itself says, but for the map. */
export interface ReadHints {
  /** Hz, for a file without a time column. */
  sampleRateHz?: number
  /** For forces in body weights. */
  bodyMassKg?: number
  /** Taken as it is, where the file's headings are those it was made for. */
  map?: ColumnMap
}

/** How a file's text is built. */
export interface DelimitedFormat {
  kind: 'delimited'
  /** A blank stands for any run of blanks and tabs. */
  delimiter: ',' | ';' | '\t' | '|' | ' '
  /** Line of the column headings, counted from 1; null where the file has none. */
  headerLine: number | null
  encoding: 'utf-8' | 'utf-16le' | 'utf-16be' | 'windows-1252'
  byteOrderMark: boolean
  lineBreak: 'LF' | 'CRLF' | 'CR'
  decimalMark: '.' | ','
}

/** Which sheet of a workbook was read. */
export interface WorkbookFormat {
  kind: 'workbook'
  sheet: string
  /** Row of the column headings, counted from 1; null where the sheet has none. */
  headerLine: number | null
}

/** How a C3D file stores its numbers, and the force plates in it. */
export interface C3dFormat {
  kind: 'c3d'
  processor: 'intel' | 'dec' | 'mips'
  storage: 'integer' | 'float'
  plates: { number: number; type: number; labels: string[] }[]
  /** 1: the headings are made by the reader, over a sample a row. */
  headerLine: number | null
}

export type FileFormat = DelimitedFormat | WorkbookFormat | C3dFormat

/** How a file is built, before its headings are found. */
export type TableFormat =
  | Omit<DelimitedFormat, 'headerLine'>
  | Omit<WorkbookFormat, 'headerLine'>
  | Omit<C3dFormat, 'headerLine'>

export interface ReadSuccess {
  ok: true
  recording: Recording
  columnMap: ColumnMap
  format: FileFormat
  /** The recording's notes: what was assumed, corrected or left out while reading. */
  notes: Note[]
  /** What the lines above the headings say of the recording. */
  metadata: Metadata
  /** The same for files with the same headings: what a saved map is found by. */
  fingerprint: string
}

export interface ReadFailure {
  ok: false
  error: ReadError
  /** Where a person can settle what the file leaves open: the file waits for its map, and is not lost. */
  needsMap?: MapRequest
}

/** All that a person needs to settle a file's map. */
export interface MapRequest {
  proposal: MapProposal
  fingerprint: string
  metadata: Metadata
  format: FileFormat
  preview: TablePreview
}

/** A table in little, made safe to show. */
export interface TablePreview {
  /** Headings over the columns; '' where there is none. */
  headings: string[]
  /** The first rows of numbers as text. */
  rows: string[][]
  /** Of each column that holds numbers: the least and greatest value of each of up to 120 stretches. */
  traces: { index: number; least: number[]; greatest: number[] }[]
}

export type ReadResult = ReadSuccess | ReadFailure
