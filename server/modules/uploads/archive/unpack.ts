import { crc32, inflateRawSync } from 'node:zlib'
import { MAX_UNPACK_RATIO, UNSUSPICIOUS_BYTES } from '../../../../shared/recordings/archive-limits.ts'
import { ReadFault } from '../../../../shared/recordings/errors.ts'
import { shown } from '../../../../shared/recordings/safe-text.ts'
import type { DirectoryEntry, Packed } from './directory.ts'

function damaged(path: string): ReadFault {
  const seen = shown(path)
  return new ReadFault('corrupt-file', `“${seen}” is damaged in the archive and cannot be unpacked.`, {
    seen,
  })
}

function inflate(packed: Uint8Array, path: string, most: number): Uint8Array {
  const byRatio = Math.max(UNSUSPICIOUS_BYTES, packed.length * MAX_UNPACK_RATIO)
  try {
    return inflateRawSync(packed, { maxOutputLength: Math.min(most, byRatio) })
  } catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'ERR_BUFFER_TOO_LARGE'))
      throw damaged(path)
    const seen = shown(path)
    if (byRatio < most) {
      const sentence = `“${seen}” unfolds to more than ${MAX_UNPACK_RATIO} times its size in the archive.`
      throw new ReadFault('unsafe-archive', sentence, { seen })
    }
    throw new ReadFault(
      'archive-too-large',
      `“${seen}” unfolds to more than ${Math.floor(most / 2 ** 20)} MiB.`,
      {
        seen,
      },
    )
  }
}

/** The bytes of a file that was unpacked before, when its size was found. */
export function unpackAgain(
  archive: Uint8Array,
  { packed, sizeBytes }: { packed: Packed; sizeBytes: number },
): Uint8Array {
  const raw = archive.subarray(packed.start, packed.start + packed.bytes)
  return packed.method === 'stored' ? raw : inflateRawSync(raw, { maxOutputLength: Math.max(1, sizeBytes) })
}

/**
 * The bytes of one file of an archive, at most `most` of them: the limits hold while it unfolds, whatever its
 * directory says.
 * @throws ReadFault `unsafe-archive`, `archive-too-large`, `unsupported-packing`, `corrupt-file`
 */
export function unpack(
  archive: Uint8Array,
  { path, packed, ...stated }: DirectoryEntry,
  most: number,
): Uint8Array {
  if (!packed) {
    const seen = shown(path)
    throw new ReadFault('unsupported-packing', `“${seen}” is packed in a way that is not read.`, { seen })
  }
  const raw = archive.subarray(packed.start, packed.start + packed.bytes)
  if (packed.method === 'stored' && raw.length > most) {
    const sentence = `“${shown(path)}” has more than ${Math.floor(most / 2 ** 20)} MiB.`
    throw new ReadFault('archive-too-large', sentence, { seen: shown(path) })
  }
  const bytes = packed.method === 'stored' ? raw : inflate(raw, path, most)
  if (bytes.length !== stated.sizeBytes || crc32(bytes) !== stated.crc32) throw damaged(path)
  return bytes
}
