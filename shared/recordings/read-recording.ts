import { buildRecording } from './delimited/build-recording.ts'
import { readBody } from './delimited/body.ts'
import { proposeMap } from './delimited/column-map.ts'
import { readHead } from './delimited/head.ts'
import { readHeading } from './delimited/header-cell.ts'
import { ReadFault, tooLargeError } from './errors.ts'
import { fileNameOnly } from './file-name.ts'
import { isUtf16, kindIfNotText } from './file-kind.ts'
import { MAX_FILE_BYTES } from './limits.ts'
import { readingNotes } from './notes.ts'
import type { ReadHints, ReadResult, ReadSuccess } from './result.ts'

/** Refuses what cannot be delimited text, by its first bytes. */
function checkKind(bytes: Uint8Array): void {
  if (bytes.length === 0) throw new ReadFault('empty-file', 'The file is empty: it has 0 bytes.')
  if (isUtf16(bytes)) throw new ReadFault('unsupported-encoding', 'The file is text in UTF-16.')
  const kind = kindIfNotText(bytes)
  if (kind) throw new ReadFault('not-a-recording', `The file is ${kind}, not delimited text.`)
  const blank = bytes.subarray(0, 4096).every((byte) => byte <= 0x20)
  if (blank && bytes.every((byte) => byte <= 0x20))
    throw new ReadFault('empty-file', 'The file holds blanks and line breaks only.')
}

function readDelimited(bytes: Uint8Array, fileName: string, hints: ReadHints): ReadSuccess {
  const head = readHead(bytes)
  const headings = head.names.map((name, index) => readHeading(name, head.units[index]))
  const map = proposeMap(headings, head.format.headerLine)
  const indices = [...(map.time ? [map.time.index] : []), ...map.forces.map((force) => force.index)]
  const body = readBody(bytes, head, indices)
  const { recording, columnMap } = buildRecording(map, body, head.bodyLine, hints)
  const { name, pathRemoved } = fileNameOnly(fileName)
  const above = head.format.headerLine - 1
  const notes = [
    ...(pathRemoved ? [readingNotes.pathRemoved(name)] : []),
    ...(above > 0 ? [readingNotes.linesBeforeHeader(above)] : []),
    ...recording.notes,
    ...(body.linesAfter.count > 0
      ? [readingNotes.linesLeftOut(body.linesAfter.count, body.linesAfter.first)]
      : []),
  ]
  return { ok: true, recording: { ...recording, notes }, columnMap, format: head.format, notes }
}

/**
 * Bytes of a file → channels of samples: delimited text with headings that name time and force and their units.
 * Forces come in newtons rounded to 0.001 N. Never throws for what a file holds: the error says what was found
 * and what to do.
 */
export function readRecording(bytes: Uint8Array, fileName: string, hints: ReadHints = {}): ReadResult {
  if (bytes.length > MAX_FILE_BYTES) return { ok: false, error: tooLargeError(bytes.length) }
  try {
    checkKind(bytes)
    return readDelimited(bytes, fileName, hints)
  } catch (error) {
    if (error instanceof ReadFault) return { ok: false, error: error.readError }
    throw error
  }
}
