import { and, asc, count, eq, isNull, sql, type SQL } from 'drizzle-orm'
import { alias } from 'drizzle-orm/pg-core'
import { limits } from '../../../shared/contracts/limits.ts'
import type { Upload } from '../../../shared/contracts/uploads.ts'
import type { Tx } from '../../db/database.ts'
import { people } from '../../db/schema/identity.ts'
import { trials } from '../../db/schema/trials.ts'
import { files, uploads, type Reading, type ReadError } from '../../db/schema/uploads.ts'
import type { StoredInArchive } from './archive/archived-file.ts'

export const ofUpload = (clubId: string, uploadId: string) =>
  and(eq(uploads.clubId, clubId), eq(uploads.id, uploadId))

const first = alias(uploads, 'first')
const archives = alias(uploads, 'archives')
const dismissers = alias(people, 'dismissers')

/** Chunks that still come, by the silence since the last: as the database sees it, not by the caller's clock. */
const lastReceivedAt = sql<Date>`greatest(${uploads.createdAt}, (
  select max(c.received_at) from club.file_chunks c
  where c.club_id = ${uploads.clubId} and c.file_id = ${uploads.fileId}))`.mapWith(uploads.createdAt)
const arriving = sql<boolean>`${uploads.state} = 'receiving' and ${uploads.dismissedAt} is null
  and now() - ${lastReceivedAt} < make_interval(secs => ${limits.arrivingSeconds})`

/** Uploads in the form that the API answers with, oldest first. */
export async function viewUploads(tx: Tx, where: SQL | undefined): Promise<Upload[]> {
  const rows = await tx
    .select({
      upload: uploads,
      sizeBytes: files.sizeBytes,
      uploadedByName: people.name,
      first: { uploadId: first.id, sessionId: first.sessionId, fileName: first.fileName },
      archive: { uploadId: archives.id, fileName: archives.fileName },
      // Only a file still on its way is taken up again.
      chunksReceived: sql<number[]>`case when ${uploads.state} = 'receiving' then array(
        select c.n from club.file_chunks c
        where c.club_id = ${uploads.clubId} and c.file_id = ${uploads.fileId} order by c.n
      ) else '{}' end`,
      lastReceivedAt,
      arriving,
      dismissedByName: dismissers.name,
      trials: sql<number>`(select count(*)::int from ${trials}
        where ${trials.clubId} = ${uploads.clubId} and ${trials.uploadId} = ${uploads.id})`,
    })
    .from(uploads)
    .innerJoin(files, and(eq(files.clubId, uploads.clubId), eq(files.id, uploads.fileId)))
    .innerJoin(people, eq(people.id, uploads.uploadedBy))
    .leftJoin(dismissers, eq(dismissers.id, uploads.dismissedBy))
    .leftJoin(first, and(eq(first.clubId, uploads.clubId), eq(first.id, uploads.duplicateOf)))
    .leftJoin(archives, and(eq(archives.clubId, uploads.clubId), eq(archives.id, uploads.archiveUploadId)))
    .where(where)
    .orderBy(asc(uploads.createdAt), asc(uploads.id))
  return rows.map(({ upload, first: duplicateOf, dismissedByName, ...row }) => ({
    ...row,
    duplicateOf,
    lastReceivedAt: row.lastReceivedAt.toISOString(),
    dismissed:
      upload.dismissedAt && dismissedByName
        ? { at: upload.dismissedAt.toISOString(), byName: dismissedByName }
        : null,
    id: upload.id,
    sessionId: upload.sessionId,
    fileName: upload.fileName,
    state: upload.state as Upload['state'],
    error: upload.error,
    notes: upload.reading?.notes ?? [],
    createdAt: upload.createdAt.toISOString(),
    version: upload.version,
  }))
}

export interface UploadRow {
  id: string
  sessionId: string
  fileId: string
  fileName: string
  state: Upload['state']
  reading: Reading | null
  sizeBytes: number
  dismissedAt: Date | null
  uploadedBy: string
  /** The upload of the archive that it came in. */
  archiveUploadId: string | null
  /** Where its bytes stand in an archive; null where they have chunks of their own. */
  storedIn: StoredInArchive | null
  createdAt: Date
}

export async function findUpload(tx: Tx, clubId: string, uploadId: string): Promise<UploadRow | null> {
  const [row] = await tx
    .select({
      id: uploads.id,
      sessionId: uploads.sessionId,
      fileId: uploads.fileId,
      fileName: uploads.fileName,
      state: sql<Upload['state']>`${uploads.state}`,
      reading: uploads.reading,
      sizeBytes: files.sizeBytes,
      dismissedAt: uploads.dismissedAt,
      uploadedBy: uploads.uploadedBy,
      archiveUploadId: uploads.archiveUploadId,
      archiveId: files.archiveId,
      archived: files.archived,
      createdAt: uploads.createdAt,
    })
    .from(uploads)
    .innerJoin(files, and(eq(files.clubId, uploads.clubId), eq(files.id, uploads.fileId)))
    .where(ofUpload(clubId, uploadId))
  if (!row) return null
  const { archiveId, archived, ...upload } = row
  return { ...upload, storedIn: archiveId && archived ? { ...archived, archiveId } : null }
}

/** Until the transaction ends the person announces no other file in the club. */
export async function lockAnnouncements(tx: Tx, clubId: string, personId: string): Promise<void> {
  const key = `announcements/${clubId}/${personId}`
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${key}, 0))`)
}

/** How much of what a person announced is not all here, less what was dismissed. */
export async function unfinishedOf(tx: Tx, clubId: string, personId: string) {
  const [row] = await tx
    .select({
      files: count(),
      bytes: sql<number>`coalesce(sum(${files.sizeBytes}), 0)`.mapWith(Number),
    })
    .from(uploads)
    .innerJoin(files, and(eq(files.clubId, uploads.clubId), eq(files.id, uploads.fileId)))
    .where(
      and(
        eq(uploads.clubId, clubId),
        eq(uploads.uploadedBy, personId),
        eq(uploads.state, 'receiving'),
        isNull(uploads.dismissedAt),
      ),
    )
  return row
}

export interface NewUpload {
  clubId: string
  sessionId: string
  fileName: string
  sizeBytes: number
  reading: Reading
  uploadedBy: string
}

export async function insertUpload(tx: Tx, { sizeBytes, ...upload }: NewUpload): Promise<string> {
  const { clubId } = upload
  const [file] = await tx.insert(files).values({ clubId, sizeBytes }).returning({ id: files.id })
  const [row] = await tx
    .insert(uploads)
    .values({ ...upload, fileId: file.id })
    .returning({ id: uploads.id })
  return row.id
}

/** What a step of an upload's way changes. */
export interface Step {
  state: Upload['state']
  fileId?: string
  duplicateOf?: string
  reading?: Reading
  error?: ReadError
}

/** Takes an upload from one state to the next; false where it is not in that state any more, or dismissed. */
export async function advance(
  tx: Tx,
  clubId: string,
  uploadId: string,
  from: Upload['state'],
  step: Step,
): Promise<boolean> {
  const moved = await tx
    .update(uploads)
    .set({ ...step, version: sql`${uploads.version} + 1` })
    .where(and(ofUpload(clubId, uploadId), eq(uploads.state, from), isNull(uploads.dismissedAt)))
    .returning({ id: uploads.id })
  return moved.length > 0
}

/** Dismisses an upload, or takes it back, at its version and in its state; false where either has changed. */
export async function setDismissed(
  tx: Tx,
  at: { clubId: string; uploadId: string; version: number; state: Upload['state'] },
  by: { personId: string; at: Date } | null,
): Promise<boolean> {
  const set = await tx
    .update(uploads)
    .set({
      dismissedAt: by?.at ?? null,
      dismissedBy: by?.personId ?? null,
      version: sql`${uploads.version} + 1`,
    })
    .where(
      and(ofUpload(at.clubId, at.uploadId), eq(uploads.version, at.version), eq(uploads.state, at.state)),
    )
    .returning({ id: uploads.id })
  return set.length > 0
}
