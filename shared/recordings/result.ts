import type { Note, Recording } from '../mechanics/types.ts'
import type { ColumnMap } from './column-map.ts'
import type { MapProposal } from './columns/map-proposal.ts'
import type { ReadError } from './errors.ts'
import type { FileFormat } from './format.ts'
import type { Metadata } from './table/metadata.ts'

export type { ColumnMap, ForceUnit, MappedColumn, MappedForce, MappedTime, TimeUnit } from './column-map.ts'
export type { C3dFormat, DelimitedFormat, FileFormat, TableFormat, WorkbookFormat } from './format.ts'
export type { ReadHints } from './hints.ts'

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
