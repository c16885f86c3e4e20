import { MAX_UNPACKED_BYTES } from '../../../../shared/recordings/archive-limits.ts'
import { ReadFault, type ReadError } from '../../../../shared/recordings/errors.ts'
import { MAX_FILE_BYTES } from '../../../../shared/recordings/limits.ts'
import { proposeMapOf, readRecording } from '../../../../shared/recordings/read-recording.ts'
import type { MapRequest, ReadFailure, ReadHints, ReadResult } from '../../../../shared/recordings/result.ts'
import type { PartOf } from '../../../../shared/recordings/workbook/parts.ts'
import { proposeWorkbookMap, readWorkbook } from '../../../../shared/recordings/workbook/read-workbook.ts'
import { type Directory, readDirectory } from './directory.ts'
import { isZip, packageKind } from './package-kind.ts'
import { type Archive, readArchive } from './read-archive.ts'
import { unpack } from './unpack.ts'

/** An archive that was taken apart: its files are to be read one by one. */
export interface ArchiveRead {
  ok: true
  archive: Archive
}

/** The parts of a workbook by their names, which do not tell capitals apart, within the limits of unpacking. */
function partsOf(bytes: Uint8Array, { files }: Directory): PartOf {
  const byPath = new Map(files.map((entry) => [entry.path.toLowerCase(), entry]))
  let left = MAX_UNPACKED_BYTES
  return (path) => {
    const entry = byPath.get(path.toLowerCase())
    if (!entry) return null
    const part = unpack(bytes, entry, left)
    left -= part.length
    return part
  }
}

async function guarded<Result>(
  read: () => Promise<Result>,
): Promise<Result | { ok: false; error: ReadError }> {
  try {
    return await read()
  } catch (error) {
    if (error instanceof ReadFault) return { ok: false, error: error.readError }
    throw error
  }
}

const isPackage = (bytes: Uint8Array): boolean => isZip(bytes) && bytes.length <= MAX_FILE_BYTES

/**
 * Reads a file of any kind: delimited text, C3D, a workbook; of an archive it says what it holds. Never throws for
 * what a file holds.
 */
export async function readAnyFile(
  bytes: Uint8Array,
  fileName: string,
  hints: ReadHints = {},
): Promise<ReadResult | ArchiveRead> {
  if (!isPackage(bytes)) return readRecording(bytes, fileName, hints)
  return guarded(async () => {
    const directory = await readDirectory(bytes)
    if (packageKind(directory) === 'workbook') return readWorkbook(partsOf(bytes, directory), hints)
    return { ok: true, archive: readArchive(bytes, directory) }
  })
}

/** What a file's columns are proposed to be, for a person to confirm or change; an archive has none. */
export async function proposeMapOfAny(
  bytes: Uint8Array,
): Promise<{ ok: true; request: MapRequest } | ReadFailure> {
  if (!isPackage(bytes)) return proposeMapOf(bytes)
  return guarded(async () => {
    const directory = await readDirectory(bytes)
    if (packageKind(directory) === 'archive')
      throw new ReadFault('not-a-recording', 'The file is an archive; each file in it has its own columns.')
    return { ok: true as const, request: proposeWorkbookMap(partsOf(bytes, directory)) }
  })
}
