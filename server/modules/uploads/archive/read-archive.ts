import { createHash } from 'node:crypto'
import { MAX_ARCHIVE_FILES, MAX_UNPACKED_BYTES } from '../../../../shared/recordings/archive-limits.ts'
import { ReadFault, type ReadError, readError } from '../../../../shared/recordings/errors.ts'
import { MAX_FILE_BYTES } from '../../../../shared/recordings/limits.ts'
import { type Directory, type DirectoryEntry, type Packed, tooMany } from './directory.ts'
import { nameOf } from './entry-name.ts'
import { unpack } from './unpack.ts'

interface Named {
  /** As in the archive, with `/` between folders. */
  path: string
  /** The path's last part. */
  name: string
}

/** A file of an archive that was unpacked whole once, and can be again. */
export interface ArchiveMember extends Named {
  sizeBytes: number
  /** Of the unpacked bytes, in hexadecimal. */
  sha256: string
  packed: Packed
}

/** A file of an archive that could not be unpacked. */
export interface LostMember extends Named {
  error: ReadError
}

export interface Archive {
  members: (ArchiveMember | LostMember)[]
  /** Files that systems put into archives by themselves, left out. */
  skipped: number
}

/** Faults of one file: the others of the archive are read all the same. */
const OF_ONE_FILE = new Set(['corrupt-file', 'unsupported-packing'])

function memberOf(archive: Uint8Array, entry: DirectoryEntry, left: number): ArchiveMember | LostMember {
  const named = { path: entry.path, name: nameOf(entry.path) }
  try {
    const bytes = unpack(archive, entry, Math.min(left, MAX_FILE_BYTES))
    if (!entry.packed) throw new RangeError('What was unpacked was packed.')
    const sha256 = createHash('sha256').update(bytes).digest('hex')
    return { ...named, sizeBytes: bytes.length, sha256, packed: entry.packed }
  } catch (error) {
    if (error instanceof ReadFault && OF_ONE_FILE.has(error.readError.code))
      return { ...named, error: error.readError }
    throw error
  }
}

/**
 * Every file of an archive, each unpacked once and let go again: its hash and where it stands.
 * @throws ReadFault where the archive as a whole is not to be read
 */
export function readArchive(archive: Uint8Array, { files, skipped }: Directory): Archive {
  if (files.length === 0) throw new ReadFault('empty-archive', 'The archive holds no file.')
  if (files.length > MAX_ARCHIVE_FILES) throw tooMany(files.length, MAX_ARCHIVE_FILES)
  let unpacked = 0
  const members = files.map((entry) => {
    const member = memberOf(archive, entry, MAX_UNPACKED_BYTES - unpacked)
    unpacked += 'error' in member ? 0 : member.sizeBytes
    return member
  })
  return { members, skipped }
}

/** An archive inside an archive is not opened: the same file could hold itself. */
export const archiveInArchive = (): ReadError =>
  readError('unsafe-archive', 'The file is an archive inside an archive, which is not opened.')
