import type { ForceChannel, Note } from '../../mechanics/types.ts'
import type { ReadError } from '../errors.ts'
import type { ForceUnit, MappedColumn, TimeUnit } from '../column-map.ts'
import type { Heading } from './heading.ts'

/** A column that may hold a vertical force. */
export interface ForceColumn extends MappedColumn {
  heading: Heading
}

/** A map on the way to be settled: units may still be open. */
export interface DraftMap {
  time: (MappedColumn & { unit: TimeUnit | null; within?: MappedColumn }) | null
  forces: (MappedColumn & { unit: ForceUnit | null; channel: ForceChannel })[]
}

/** Why a column was taken for what it is, and how sure that is. */
export interface Why {
  /** 0 to 1. */
  confidence: number
  sentence: string
}

/** What the headings and numbers of a file make of its columns. */
export interface Settled {
  draft: DraftMap
  notes: Note[]
  /** What only a person can settle; null where the map can be taken as it is. */
  problem: ReadError | null
  /** By column index; what the headings say is not repeated here. */
  whys: Map<number, Why>
}
