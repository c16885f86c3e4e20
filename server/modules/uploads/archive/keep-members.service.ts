import type { Tx } from '../../../db/database.ts'
import { sendJobs } from '../../../jobs/queue.ts'
import { findSameFile } from '../files.queries.ts'
import type { UploadRow } from '../uploads.queries.ts'
import { insertArchivedFile, insertMemberUpload } from './archived.queries.ts'
import { archiveNotes } from './notes.ts'
import type { Archive, ArchiveMember, LostMember } from './read-archive.ts'

/** Where a member's bytes are and what is to become of its upload. */
type Placed =
  | { fileId: string; state: 'waiting' }
  | { fileId: string; state: 'duplicate'; duplicateOf: string }
  | { fileId: string; state: 'refused'; error: LostMember['error'] }

/** The bytes of a member are one file of the club, wherever they came first; lost ones point to their archive. */
async function place(
  tx: Tx,
  clubId: string,
  archiveId: string,
  member: ArchiveMember | LostMember,
): Promise<Placed> {
  if ('error' in member) return { fileId: archiveId, state: 'refused', error: member.error }
  const sha256 = Buffer.from(member.sha256, 'hex')
  const same = await findSameFile(tx, clubId, sha256)
  if (same?.uploadId) return { fileId: same.fileId, state: 'duplicate', duplicateOf: same.uploadId }
  if (same) return { fileId: same.fileId, state: 'waiting' }
  const { path, sizeBytes, packed } = member
  const archived = { path, ...packed }
  return {
    fileId: await insertArchivedFile(tx, { clubId, sizeBytes, sha256, archiveId, archived }),
    state: 'waiting',
  }
}

/**
 * Makes an upload of each file of an archive, in the archive's order and as its sender's, and has the new ones read.
 * The archive itself stays as it came: its files are read out of it.
 */
export async function keepMembers(
  tx: Tx,
  clubId: string,
  upload: UploadRow,
  archive: Archive,
): Promise<void> {
  const waiting: string[] = []
  for (const [i, member] of archive.members.entries()) {
    const placed = await place(tx, clubId, upload.fileId, member)
    const uploadId = await insertMemberUpload(tx, {
      clubId,
      sessionId: upload.sessionId,
      fileName: member.name,
      uploadedBy: upload.uploadedBy,
      archiveUploadId: upload.id,
      archivePlace: i + 1,
      reading: { notes: [archiveNotes.cameInArchive(upload.fileName, member.path)] },
      // One after the other, a millisecond apart: lists show files in the order in which they came.
      createdAt: new Date(upload.createdAt.getTime() + i + 1),
      ...placed,
    })
    if (placed.state === 'waiting') waiting.push(uploadId)
  }
  await sendJobs(tx, 'read-upload', ...waiting.map((uploadId) => ({ version: 1 as const, clubId, uploadId })))
}
