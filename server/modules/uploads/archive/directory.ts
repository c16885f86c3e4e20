import { type Entry, fromBufferPromise, type ZipFile } from 'yauzl'
import { MAX_ARCHIVE_ENTRIES } from '../../../../shared/recordings/archive-limits.ts'
import { ReadFault } from '../../../../shared/recordings/errors.ts'
import { shown } from '../../../../shared/recordings/safe-text.ts'
import { entryPath, isSkipped, refuseUnsafePath } from './entry-name.ts'

/** Where an entry's bytes stand in the archive, and how they are packed. */
export interface Packed {
  /** First byte of the packed data. */
  start: number
  /** Packed bytes. */
  bytes: number
  method: 'stored' | 'deflated'
}

export interface DirectoryEntry {
  path: string
  /** null: packed in a way that is not read. */
  packed: Packed | null
  /** As the directory says; unpacking holds it to that. */
  sizeBytes: number
  crc32: number
}

export interface Directory {
  /** Without folders and what is skipped. */
  files: DirectoryEntry[]
  /** Entries that systems put there by themselves. */
  skipped: number
}

const METHODS: Record<number, Packed['method']> = { 0: 'stored', 8: 'deflated' }

/** Of the upper half of the external attributes under Unix: the type of a symbolic link. */
const LINK = 0o120000
const TYPE_MASK = 0o170000

function refuseUnsafe(entry: Entry, path: string): void {
  refuseUnsafePath(path)
  if (((entry.externalFileAttributes >>> 16) & TYPE_MASK) === LINK) {
    const seen = shown(path)
    throw new ReadFault('unsafe-archive', `The archive holds a link in place of a file: “${seen}”.`, { seen })
  }
  if (entry.isEncrypted()) throw protectedArchive()
}

const protectedArchive = (): ReadFault =>
  new ReadFault('archive-protected', 'The archive is protected by a password.')

async function readEntry(zip: ZipFile, entry: Entry, path: string): Promise<DirectoryEntry> {
  const { fileDataStart: start } = await zip.readLocalFileHeaderPromise(entry, { minimal: true })
  const method = METHODS[entry.compressionMethod]
  return {
    path,
    packed: method ? { start, bytes: entry.compressedSize, method } : null,
    sizeBytes: entry.uncompressedSize,
    crc32: entry.crc32,
  }
}

/** Two entries of one name, or over the same bytes, are made to deceive or to unfold without end. */
function refuseOverlaps(files: readonly DirectoryEntry[]): void {
  const paths = new Set<string>()
  for (const { path } of files) {
    if (paths.has(path)) {
      const seen = shown(path)
      throw new ReadFault('unsafe-archive', `The archive holds two files named “${seen}”.`, { seen })
    }
    paths.add(path)
  }
  const stretches = files.flatMap(({ packed }) => packed ?? []).sort((a, b) => a.start - b.start)
  for (const [i, { start, bytes }] of stretches.entries()) {
    const next = stretches[i + 1]
    if (next && start + bytes > next.start)
      throw new ReadFault('unsafe-archive', 'Two files of the archive share the same bytes.')
  }
}

/**
 * The directory of a zip archive; nothing is unpacked.
 * @throws ReadFault `unsafe-archive`, `archive-protected`, `archive-too-large`, `corrupt-file`
 */
export async function readDirectory(bytes: Uint8Array): Promise<Directory> {
  const files: DirectoryEntry[] = []
  let skipped = 0
  try {
    const buffer = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength)
    const zip = await fromBufferPromise(buffer, { lazyEntries: true, decodeStrings: false, autoClose: false })
    let entries = 0
    for await (const entry of zip.eachEntry()) {
      if (++entries > MAX_ARCHIVE_ENTRIES) throw tooMany(zip.entryCount, MAX_ARCHIVE_ENTRIES)
      const path = entryPath(entry)
      refuseUnsafe(entry, path)
      if (path.endsWith('/')) continue
      if (isSkipped(path)) skipped++
      else files.push(await readEntry(zip, entry, path))
    }
  } catch (error) {
    throw named(error)
  }
  refuseOverlaps(files)
  return { files, skipped }
}

/** More entries than are read. */
export const tooMany = (files: number, most: number): ReadFault =>
  new ReadFault(
    'archive-too-large',
    `The archive holds ${files} files, and ${most} is the most that is read.`,
  )

/** Whatever the package for zip files makes of an archive is the archive's doing. */
function named(error: unknown): ReadFault {
  if (error instanceof ReadFault) return error
  if (error instanceof Error && error.message.includes('encryption')) return protectedArchive()
  return new ReadFault('corrupt-file', 'The archive is damaged: its list of files cannot be read.')
}
