import { and, eq } from 'drizzle-orm'
import { limits } from '../../../shared/contracts/limits.ts'
import type { Upload } from '../../../shared/contracts/uploads.ts'
import { fileNameOnly } from '../../../shared/recordings/file-name.ts'
import { readingNotes } from '../../../shared/recordings/notes.ts'
import { databaseErrorOf } from '../../db/constraint-errors.ts'
import type { Tx } from '../../db/database.ts'
import { uploads } from '../../db/schema/uploads.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { notFound } from '../../http/errors.ts'
import { sendJobs } from '../../jobs/queue.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import { requireSession } from '../sessions/sessions.service.ts'
import { chunkCount, chunkLength, chunksOf, hashFile } from './chunks.ts'
import { chunkNumbers, dropFile, findSameFile, finishFile, insertChunk } from './files.queries.ts'
import {
  chunkInvalid,
  fileNameInvalid,
  fileTooLarge,
  tooManyUploads,
  uploadDismissed,
  uploadFinished,
  uploadIncomplete,
} from './uploads.errors.ts'
import {
  advance,
  findUpload,
  insertUpload,
  lockAnnouncements,
  ofUpload,
  unfinishedOf,
  type UploadRow,
  viewUploads,
} from './uploads.queries.ts'

/** Announces a file. A path in its name is left off, with a note; a file over the limit leaves nothing behind. */
export async function startUpload(
  deps: Deps,
  ctx: Caller,
  sessionId: string,
  file: { fileName: string; sizeBytes: number },
): Promise<Upload> {
  if (file.sizeBytes > limits.fileBytes) throw fileTooLarge(file.sizeBytes)
  const { name, pathRemoved } = fileNameOnly(file.fileName)
  if (!/[\p{L}\p{N}]/u.test(file.fileName)) throw fileNameInvalid(file.fileName)
  return deps.db.inClub(ctx, async (tx) => {
    await requireSession(tx, ctx, sessionId)
    await requireRoom(tx, ctx, file.sizeBytes)
    const uploadId = await insertUpload(tx, {
      clubId: ctx.clubId,
      sessionId,
      fileName: name,
      sizeBytes: file.sizeBytes,
      reading: { notes: pathRemoved ? [readingNotes.pathRemoved(name)] : [] },
      uploadedBy: ctx.personId,
    })
    await record(tx, ctx, 'upload.start', 'upload', uploadId)
    await notify(tx, ctx.clubId, { kind: 'session', id: sessionId })
    return view(tx, ctx, uploadId)
  })
}

/** What one person has half-way stays within limits, however many pages announce at once. */
async function requireRoom(tx: Tx, { clubId, personId }: Caller, sizeBytes: number): Promise<void> {
  await lockAnnouncements(tx, clubId, personId)
  const { files, bytes } = await unfinishedOf(tx, clubId, personId)
  if (files >= limits.unfinishedUploads || bytes + sizeBytes > limits.unfinishedBytes) throw tooManyUploads()
}

/** Stores one chunk: any order, repeatable; one that came first stands. */
export async function storeChunk(
  deps: Deps,
  ctx: Caller,
  { uploadId, n, bytes }: { uploadId: string; n: number; bytes: Buffer },
): Promise<void> {
  await deps.db.inClub(ctx, async (tx) => {
    const upload = await requireUpload(tx, ctx, uploadId)
    if (upload.state !== 'receiving') throw uploadFinished()
    if (upload.dismissedAt) throw uploadDismissed()
    const expected = chunkLength(upload.sizeBytes, n)
    if (expected <= 0)
      throw chunkInvalid(`This file has ${chunkCount(upload.sizeBytes)} parts, and no part ${n + 1}.`)
    if (bytes.length !== expected) {
      throw chunkInvalid(
        `Part ${n + 1} must have ${expected} bytes, and ${bytes.length} came. Send it again.`,
      )
    }
    const outcome = await insertChunk(tx, { clubId: ctx.clubId, fileId: upload.fileId, n, bytes })
    if (outcome === 'different') {
      throw chunkInvalid(`Part ${n + 1} came before with other bytes. Upload the file anew.`, 409)
    }
  })
}

/** Closes a file: hashed, recognised where the club has its bytes, else queued for reading. Safe to repeat. */
export async function finishUpload(deps: Deps, ctx: Caller, uploadId: string): Promise<Upload> {
  const upload = await deps.db.inClub(ctx, (tx) => requireComplete(tx, ctx, uploadId))
  if (upload.state === 'receiving') {
    const sha256 = await hashFile(deps, ctx, upload)
    const isNew = await deps.db
      .inClub(ctx, (tx) => finishNew(tx, ctx, upload, sha256))
      .catch(falseIfSameBytes)
    if (!isNew) await deps.db.inClub(ctx, (tx) => finishSame(tx, ctx, upload, sha256))
  }
  return deps.db.inClub(ctx, (tx) => view(tx, ctx, uploadId))
}

async function finishNew(tx: Tx, ctx: Caller, upload: UploadRow, sha256: Buffer): Promise<true> {
  await finishFile(tx, ctx.clubId, upload.fileId, sha256)
  await passOn(tx, ctx, upload, upload.fileId)
  return true
}

/** The unique key on a club's hashes decides which of two that finish at once is the first. */
function falseIfSameBytes(error: unknown): false {
  if (databaseErrorOf(error)?.constraint === 'files_sha256') return false
  throw error
}

/**
 * The club has these bytes: they are kept once. The upload is a duplicate, unless all others of that file were
 * refused, and then it is read anew.
 */
async function finishSame(tx: Tx, ctx: Caller, upload: UploadRow, sha256: Buffer): Promise<void> {
  const same = await findSameFile(tx, ctx.clubId, sha256)
  if (!same) throw new Error('The file with the same bytes is gone.')
  if (same.fileId === upload.fileId) return
  if (same.uploadId) {
    const step = { state: 'duplicate', fileId: same.fileId, duplicateOf: same.uploadId } as const
    if (!(await advance(tx, ctx.clubId, upload.id, 'receiving', step))) return
    await notify(tx, ctx.clubId, { kind: 'session', id: upload.sessionId })
  } else if (!(await passOn(tx, ctx, upload, same.fileId))) return
  await dropFile(tx, ctx.clubId, upload.fileId)
}

/** To the read job; false where another request did it first. */
async function passOn(tx: Tx, ctx: Caller, upload: UploadRow, fileId: string): Promise<boolean> {
  const passed = await advance(tx, ctx.clubId, upload.id, 'receiving', { state: 'waiting', fileId })
  if (!passed) return false
  await sendJobs(tx, 'read-upload', { version: 1, clubId: ctx.clubId, uploadId: upload.id })
  await notify(tx, ctx.clubId, { kind: 'session', id: upload.sessionId })
  return true
}

/** The original, chunk by chunk. */
export async function openOriginal(deps: Deps, ctx: Caller, uploadId: string) {
  const upload = await deps.db.inClub(ctx, (tx) => requireComplete(tx, ctx, uploadId))
  if (upload.state === 'receiving') throw uploadIncomplete([])
  return { fileName: upload.fileName, sizeBytes: upload.sizeBytes, chunks: chunksOf(deps, ctx, upload) }
}

export async function view(tx: Tx, ctx: Caller, uploadId: string): Promise<Upload> {
  const [upload] = await viewUploads(tx, ofUpload(ctx.clubId, uploadId))
  return upload
}

export async function requireUpload(tx: Tx, ctx: Caller, uploadId: string): Promise<UploadRow> {
  const upload = await findUpload(tx, ctx.clubId, uploadId)
  if (!upload) throw notFound('This file')
  return upload
}

/** An upload all of whose chunks are there. */
async function requireComplete(tx: Tx, ctx: Caller, uploadId: string): Promise<UploadRow> {
  const upload = await requireUpload(tx, ctx, uploadId)
  if (upload.state !== 'receiving') return upload
  if (upload.dismissedAt) throw uploadDismissed()
  const there = new Set(await chunkNumbers(tx, ctx.clubId, upload.fileId))
  const missing = Array.from({ length: chunkCount(upload.sizeBytes) }, (_, n) => n).filter(
    (n) => !there.has(n),
  )
  if (missing.length > 0) throw uploadIncomplete(missing)
  return upload
}

/** The files of a session's sheet, oldest first. */
export const uploadsOfSession = (tx: Tx, clubId: string, sessionId: string): Promise<Upload[]> =>
  viewUploads(tx, and(eq(uploads.clubId, clubId), eq(uploads.sessionId, sessionId)))
