import { byteOrderMarkLength } from '../file-kind.ts'
import type { DelimitedFormat } from '../format.ts'

export type Encoding = DelimitedFormat['encoding']

/** A file's bytes in a form whose numbers are single bytes, and how to read its words. */
export interface DecodedBytes {
  encoding: Encoding
  byteOrderMark: boolean
  /** Without the byte order mark; UTF-8 where the file was UTF-16, else the file's own bytes. */
  bytes: Uint8Array
  /** Reads words out of `bytes`. */
  decode: (piece: Uint8Array) => string
}

/** How much of a file is looked at to tell encodings apart. */
const LOOKED_AT = 4096

const utf8 = new TextDecoder('utf-8', { ignoreBOM: true })
/** A superset of Latin-1: the two differ in 27 control characters that no export holds. */
const windows1252 = new TextDecoder('windows-1252')

/**
 * Byte order of UTF-16 without a mark: text of figures has a zero in every second byte. null for anything else.
 */
function unmarkedUtf16(bytes: Uint8Array): 'utf-16le' | 'utf-16be' | null {
  const looked = Math.min(bytes.length, 512) & ~1
  if (looked < 8) return null
  let [even, odd] = [0, 0]
  for (let i = 0; i < looked; i += 2) {
    if (bytes[i] === 0) even++
    if (bytes[i + 1] === 0) odd++
  }
  const most = 0.4 * looked
  if (odd >= most && even < 0.05 * looked) return 'utf-16le'
  return even >= most && odd < 0.05 * looked ? 'utf-16be' : null
}

function utf16Of(bytes: Uint8Array): 'utf-16le' | 'utf-16be' | null {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return 'utf-16le'
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return 'utf-16be'
  return bytes[0] === 0 || bytes[1] === 0 ? unmarkedUtf16(bytes) : null
}

/** Whether a file is text in UTF-16, with a byte order mark or without. */
export function isUtf16(bytes: Uint8Array): boolean {
  return utf16Of(bytes) !== null
}

function isAscii(bytes: Uint8Array): boolean {
  let all = 0
  for (let i = 0; i < bytes.length; i++) all |= bytes[i] as number
  return all < 0x80
}

function isUtf8(bytes: Uint8Array): boolean {
  if (isAscii(bytes)) return true
  try {
    // A character cut by the end of the piece is no fault.
    new TextDecoder('utf-8', { fatal: true }).decode(bytes, { stream: true })
    return true
  } catch {
    return false
  }
}

/** Which encoding a file is in, and its bytes in a form whose figures and marks are single bytes. */
export function decodeBytes(file: Uint8Array): DecodedBytes {
  const utf16 = utf16Of(file)
  if (utf16) {
    const marked = (file[0] ?? 0) >= 0xfe
    const text = new TextDecoder(utf16).decode(file)
    const bytes = new TextEncoder().encode(text)
    return { encoding: utf16, byteOrderMark: marked, bytes, decode: (piece) => utf8.decode(piece) }
  }
  const mark = byteOrderMarkLength(file)
  const bytes = mark > 0 ? file.subarray(mark) : file
  const encoding = mark > 0 || isUtf8(bytes.subarray(0, LOOKED_AT)) ? 'utf-8' : 'windows-1252'
  const decoder = encoding === 'utf-8' ? utf8 : windows1252
  return { encoding, byteOrderMark: mark > 0, bytes, decode: (piece) => decoder.decode(piece) }
}
