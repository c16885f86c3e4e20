import { basename } from 'node:path'
import type { Settings } from '../../shared/mechanics/settings.ts'
import { readAnyFile } from '../modules/uploads/archive/read-any-file.ts'
import {
  type ArchiveMember,
  archiveInArchive,
  type LostMember,
} from '../modules/uploads/archive/read-archive.ts'
import { unpackAgain } from '../modules/uploads/archive/unpack.ts'
import {
  failedEntry,
  type FileEntry,
  type GivenFacts,
  hintsOf,
  readingEntry,
  sha256Of,
} from './analysis-document.ts'

/**
 * Reads and analyses a file of any kind as the server does: an archive gives an entry for each of its files, named
 * by the archive and the file's path in it.
 */
export async function fileEntries(
  file: string,
  bytes: Uint8Array,
  given: GivenFacts,
  settings: Settings,
): Promise<FileEntry[]> {
  const read = await readAnyFile(bytes, basename(file), hintsOf(given))
  if (!read.ok || !('archive' in read))
    return [readingEntry({ file, sha256: sha256Of(bytes) }, read, given, settings)]
  const entries: FileEntry[] = []
  for (const member of read.archive.members)
    entries.push(await memberEntry(`${file}/${member.path}`, bytes, member, { given, settings }))
  return entries
}

async function memberEntry(
  file: string,
  archive: Uint8Array,
  member: ArchiveMember | LostMember,
  { given, settings }: { given: GivenFacts; settings: Settings },
): Promise<FileEntry> {
  if ('error' in member) return failedEntry(file, null, member.error)
  const read = await readAnyFile(unpackAgain(archive, member), member.name, hintsOf(given))
  if (read.ok && 'archive' in read) return failedEntry(file, member.sha256, archiveInArchive())
  return readingEntry({ file, sha256: member.sha256 }, read, given, settings)
}
