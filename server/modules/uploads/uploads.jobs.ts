import type { Test } from '../../../shared/contracts/tests.ts'
import type { Tx } from '../../db/database.ts'
import { workerContext } from '../../db/database.ts'
import type { ReadError } from '../../db/schema/uploads.ts'
import type { Deps } from '../../deps.ts'
import { defineJob, type JobDeps } from '../../jobs/define-job.ts'
import type { FileRead } from '../../jobs/threads/tasks.ts'
import { ThreadEnded } from '../../jobs/threads/threads.ts'
import { notify } from '../events/notify.ts'
import { candidatesOf } from '../sessions/sessions.service.ts'
import { addTrials } from '../trials/add-trial.service.ts'
import { keepMembers } from './archive/keep-members.service.ts'
import { archiveNotes } from './archive/notes.ts'
import { type Archive, archiveInArchive } from './archive/read-archive.ts'
import { wholeFile } from './chunks.ts'
import { readingEnded, readingFailed } from './uploads.errors.ts'
import { advance, findUpload, type Step, type UploadRow } from './uploads.queries.ts'

/**
 * Reads a file in a thread, and makes its trials or says why there are none. Run twice, it finds the upload out of
 * `waiting` and leaves everything as it is.
 */
export const readUploadJob = defineJob('read-upload', async (deps, { clubId, uploadId }) => {
  const ctx = workerContext(clubId)
  const waiting = await deps.db.inClub(ctx, async (tx) => {
    const upload = await findUpload(tx, clubId, uploadId)
    if (upload?.state !== 'waiting') return null
    return { upload, test: (await candidatesOf(tx, clubId, upload.sessionId)).test }
  })
  if (!waiting) return
  const { upload, test } = waiting
  const result = await readInThread(deps, upload, test, () => wholeFile(deps, ctx, upload))
  await deps.db.inClub(ctx, async (tx) => {
    if (!result.ok) await settle(tx, clubId, upload, { state: 'refused', error: result.error })
    else if ('archive' in result) await takeApart(tx, clubId, upload, result.archive)
    else await keepTrials(tx, clubId, upload, result)
  })
})

/** Every try ended badly: the upload says so, instead of waiting for ever. */
export const giveUpReadingJob = defineJob('give-up-reading', (deps, { clubId, uploadId }) =>
  refuse(deps, clubId, uploadId, readingFailed()),
)

async function refuse(deps: Deps, clubId: string, uploadId: string, error: ReadError): Promise<void> {
  await deps.db.inClub(workerContext(clubId), async (tx) => {
    const upload = await findUpload(tx, clubId, uploadId)
    if (upload) await settle(tx, clubId, upload, { state: 'refused', error })
  })
}

async function readInThread(
  { threads }: JobDeps,
  { fileName }: UploadRow,
  test: Test,
  fetch: () => Promise<Uint8Array>,
) {
  try {
    return await threads.readFile(async () => ({ fileName, test, bytes: await fetch() }))
  } catch (error) {
    if (error instanceof ThreadEnded) return { ok: false as const, error: readingEnded(error) }
    throw error
  }
}

async function keepTrials(tx: Tx, clubId: string, upload: UploadRow, read: FileRead): Promise<void> {
  const { format, columnMap, sampleRateHz } = read
  const notes = [...(upload.reading?.notes ?? []), ...read.notes]
  const reading = { notes, format, columnMap, sampleRateHz }
  if (await settle(tx, clubId, upload, { state: 'read', reading })) await addTrials(tx, clubId, upload, read)
}

/** Makes uploads of an archive's files; an archive that came in another one stays closed. */
async function takeApart(tx: Tx, clubId: string, upload: UploadRow, archive: Archive): Promise<void> {
  if (upload.archiveUploadId) {
    await settle(tx, clubId, upload, { state: 'refused', error: archiveInArchive() })
    return
  }
  const unpacked = archiveNotes.unpacked(archive.members.length, archive.skipped)
  const reading = { notes: [...(upload.reading?.notes ?? []), unpacked] }
  if (await settle(tx, clubId, upload, { state: 'unpacked', reading }))
    await keepMembers(tx, clubId, upload, archive)
}

/** Takes the upload out of `waiting`; false where that was done already. */
async function settle(tx: Tx, clubId: string, upload: UploadRow, step: Step): Promise<boolean> {
  const settled = await advance(tx, clubId, upload.id, 'waiting', step)
  if (settled) await notify(tx, clubId, { kind: 'session', id: upload.sessionId })
  return settled
}
