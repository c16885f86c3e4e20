import type { ForceChannel } from '../../shared/mechanics/types.ts'
import type { ReadError } from '../../shared/recordings/errors.ts'
import type { FileFormat, ReadHints } from '../../shared/recordings/result.ts'
import type { Metadata } from '../../shared/recordings/table/metadata.ts'

/** What `expected.json` of a numbered folder says; beside it lies `input.*`, or `input` says how to make it. */
export interface Case {
  fileName?: string
  hints?: ReadHints
  /** A file too large to keep: the head, then the repeated text up to so many bytes. */
  input?: { head: string; repeat: string; bytes: number }
  reading?: {
    sampleRateHz: number
    filledSamples: number
    channels: Partial<Record<ForceChannel, number[]>>
    /** Codes, in order. */
    notes: string[]
    format?: Partial<FileFormat>
    time?: { index: number; unit: string } | null
    forces?: { index: number; unit: string; channel: ForceChannel; downward?: true }[]
    metadata?: Metadata
  }
  error?: Partial<ReadError>
  /** Of an error that a person can settle: what is proposed. */
  proposal?: {
    time: { index: number; unit: string } | null
    forces: { index: number; channel: ForceChannel }[]
  }
}
