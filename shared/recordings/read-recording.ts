import type { Note } from '../mechanics/types.ts'
import { c3dTable } from './c3d/c3d-table.ts'
import { isC3d } from './c3d/header.ts'
import { delimitedTable } from './delimited/delimited-table.ts'
import { isUtf16 } from './delimited/encoding.ts'
import { ReadFault, tooLargeError } from './errors.ts'
import { fileNameOnly } from './file-name.ts'
import { kindIfNotText } from './file-kind.ts'
import { MAX_FILE_BYTES } from './limits.ts'
import { readingNotes } from './notes.ts'
import type { MapRequest, ReadHints, ReadResult } from './result.ts'
import { proposeMap, readTable } from './table/read-table.ts'
import type { Table } from './table/table.ts'

/** Refuses what cannot be delimited text, by its first bytes. */
function checkKind(bytes: Uint8Array): void {
  if (bytes.length === 0) throw new ReadFault('empty-file', 'The file is empty: it has 0 bytes.')
  if (isUtf16(bytes)) return
  const kind = kindIfNotText(bytes)
  if (kind) throw new ReadFault('not-a-recording', `The file is ${kind}, not delimited text.`)
  const blank = bytes.subarray(0, 4096).every((byte) => byte <= 0x20)
  if (blank && bytes.every((byte) => byte <= 0x20))
    throw new ReadFault('empty-file', 'The file holds blanks and line breaks only.')
}

function pathNote(fileName: string): Note[] {
  const { name, pathRemoved } = fileNameOnly(fileName)
  return pathRemoved ? [readingNotes.pathRemoved(name)] : []
}

function withNotes(result: ReadResult, before: Note[]): ReadResult {
  if (!result.ok || before.length === 0) return result
  const notes = [...before, ...result.notes]
  return { ...result, notes, recording: { ...result.recording, notes } }
}

/** The table that a file holds, by its first bytes, and what reading it took on trust. */
function tableOf(bytes: Uint8Array): { table: Table; notes: Note[] } {
  if (isC3d(bytes)) return c3dTable(bytes)
  checkKind(bytes)
  return { table: delimitedTable(bytes), notes: [] }
}

/** Runs a reader; a fault becomes its error. */
function guarded<Result>(bytes: Uint8Array, read: () => Result): Result | Extract<ReadResult, { ok: false }> {
  if (bytes.length > MAX_FILE_BYTES) return { ok: false, error: tooLargeError(bytes.length) }
  try {
    return read()
  } catch (error) {
    if (error instanceof ReadFault) return { ok: false, error: error.readError }
    throw error
  }
}

/**
 * Bytes of a file → channels of samples: delimited text or C3D, by its headings or by the column map in `hints`.
 * Forces come in newtons rounded to 0.001 N. Never throws for what a file holds: the error says what was found and
 * what to do, and has `needsMap` beside it where a person can settle what the columns are.
 */
export function readRecording(bytes: Uint8Array, fileName: string, hints: ReadHints = {}): ReadResult {
  return guarded(bytes, () => {
    const { table, notes } = tableOf(bytes)
    return withNotes(readTable(table, hints), [...pathNote(fileName), ...notes])
  })
}

/** What a file's columns are proposed to be, for a person to confirm or change. */
export function proposeMapOf(
  bytes: Uint8Array,
): { ok: true; request: MapRequest } | Extract<ReadResult, { ok: false }> {
  return guarded(bytes, () => ({ ok: true as const, request: proposeMap(tableOf(bytes).table) }))
}
