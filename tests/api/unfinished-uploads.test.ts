import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { limits } from '../../shared/contracts/limits.ts'
import { getSession } from '../../shared/contracts/sessions.ts'
import {
  changeUpload,
  finishUpload,
  getOriginal,
  startUpload,
  type Upload,
} from '../../shared/contracts/uploads.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { buildTrial, buildUpload } from '../../seed/builders/trial.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { refusalOf, type ApiClient } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import { chunk, dropFile, finish, sendFile, startTestingDay, type TestingDay } from './harness/testing-day.ts'

let harness: Harness
let day: TestingDay
let colleague: ApiClient
let colleagueId: string

beforeAll(async () => {
  harness = await startHarness()
  day = await startTestingDay(harness, ['Mara Ostrow'])
  const member = await buildMember(harness.db, day.clubId, ['physio'], { name: 'Tove Lindgard' })
  colleague = await harness.signedIn(member)
  colleagueId = member.id
})
afterAll(() => harness.stop())

const text = (words: string) => new TextEncoder().encode(words)
const change = (client: ApiClient, upload: Upload, dismissed: boolean) =>
  client.call(changeUpload, {
    params: { uploadId: upload.id },
    body: { version: upload.version, dismissed },
  })
const refusal = async (client: ApiClient, upload: Upload) =>
  refusalOf(
    await client.send(changeUpload, {
      params: { uploadId: upload.id },
      body: { version: upload.version, dismissed: true },
    }),
  )
const onSheet = async (uploadId: string) => {
  const { uploads } = await day.coach.call(getSession, { params: { sessionId: day.session.id } })
  const upload = uploads.find(({ id }) => id === uploadId)
  if (!upload) throw new Error('The sheet has lost the upload.')
  return upload
}
const inDatabase = (sql: string, values: unknown[]) =>
  onDatabase(harness.database.adminUrl, async (admin) => (await admin.query(sql, values)).rows as unknown[])

/** One whole part of two has come. */
async function halfWay(fileName: string): Promise<Upload> {
  const bytes = new Uint8Array(limits.chunkBytes + 1)
  const { id } = await sendFile(day.coach, day.session.id, fileName, bytes.subarray(0, 0))
  await inDatabase(
    'update club.files f set size_bytes = $2 from club.uploads u where u.id = $1 and f.id = u.file_id',
    [id, bytes.length],
  )
  await chunk(day.coach, id, 0, bytes.subarray(0, limits.chunkBytes)).expect(200)
  return onSheet(id)
}
const fallSilent = (upload: Upload) =>
  inDatabase(
    `with old as (update club.uploads set created_at = now() - interval '1 hour' where id = $1 returning file_id)
     update club.file_chunks c set received_at = now() - interval '1 hour' from old where c.file_id = old.file_id`,
    [upload.id],
  )

describe('a file that will not become a trial', () => {
  it('is dismissed by whoever may measure, says by whom and when, and is noted in the audit log', async () => {
    const bytes = text('one and the same')
    await dropFile(day.coach, day.session.id, 'first.csv', bytes)
    const upload = await dropFile(day.coach, day.session.id, 'again.csv', bytes)
    expect(upload).toMatchObject({ state: 'duplicate', dismissed: null })
    const dismissed = await change(colleague, upload, true)
    const stamp = { at: harness.time.now.toISOString(), byName: 'Tove Lindgard' }
    expect(dismissed).toMatchObject({ state: 'duplicate', dismissed: stamp, version: upload.version + 1 })
    expect(await onSheet(upload.id)).toEqual(dismissed)
    const noted = 'select action, person_id from club.audit_log where subject_id = $1 order by at'
    expect((await inDatabase(noted, [upload.id])).at(-1)).toEqual({
      action: 'upload.dismiss',
      person_id: colleagueId,
    })
  })

  it('keeps its bytes, and stands as before once it is taken back', async () => {
    const bytes = text('kept byte for byte')
    await dropFile(day.coach, day.session.id, 'kept.csv', bytes)
    const upload = await dropFile(day.coach, day.session.id, 'kept again.csv', bytes)
    const dismissed = await change(day.coach, upload, true)
    const original = await day.coach.send(getOriginal, { params: { uploadId: upload.id } }).buffer(true)
    expect(Buffer.from(bytes).equals(original.body as Buffer)).toBe(true)
    expect(await change(day.coach, dismissed, false)).toEqual({ ...upload, version: upload.version + 2 })
  })

  it('is dismissed at its present version only, and the newer is told', async () => {
    const bytes = text('stale')
    await dropFile(day.coach, day.session.id, 'stale.csv', bytes)
    const upload = await dropFile(day.coach, day.session.id, 'stale again.csv', bytes)
    const newer = await change(day.coach, upload, true)
    const stale = await colleague.send(changeUpload, {
      params: { uploadId: upload.id },
      body: { version: upload.version, dismissed: true },
    })
    expect(refusalOf(stale)).toEqual([409, 'stale-version'])
    expect((stale.body as { error: { details: unknown } }).error.details).toEqual({ newer })
  })
})

describe('a file that is in use', () => {
  it('is not dismissed while it waits to be read', async () => {
    const upload = await dropFile(day.coach, day.session.id, 'waits.csv', text('waits'))
    expect(await refusal(day.coach, upload)).toEqual([409, 'upload-in-use'])
  })

  it('is not dismissed once it has trials', async () => {
    const owner = { sessionId: day.session.id, uploadedBy: colleagueId }
    const uploadId = await buildUpload(harness.db, day.clubId, owner)
    await buildTrial(harness.db, day.clubId, { sessionId: day.session.id, uploadId, athleteId: null })
    expect(await refusal(day.coach, await onSheet(uploadId))).toEqual([409, 'upload-in-use'])
  })
})

describe('a file that is not all here', () => {
  it('is said to arrive while its parts come, and may be dismissed by its sender alone', async () => {
    const upload = await halfWay('running.csv')
    expect(upload).toMatchObject({ arriving: true, chunksReceived: [0] })
    expect(await refusal(colleague, upload)).toEqual([409, 'upload-in-use'])
    expect(await change(day.coach, upload, true)).toMatchObject({ state: 'receiving', arriving: false })
  })

  it('has stopped once nothing came for a while, and may be dismissed by anybody who measures', async () => {
    const begun = await halfWay('stopped.csv')
    await fallSilent(begun)
    const stopped = await onSheet(begun.id)
    expect(stopped.arriving).toBe(false)
    expect(Date.parse(stopped.lastReceivedAt)).toBeLessThan(Date.parse(begun.lastReceivedAt))
    expect((await change(colleague, stopped, true)).dismissed?.byName).toBe('Tove Lindgard')
  })

  it('takes no part and no end while it is dismissed, and both again once it is taken back', async () => {
    const upload = await halfWay('resumed.csv')
    const dismissed = await change(day.coach, upload, true)
    const last = () => chunk(day.coach, upload.id, 1, new Uint8Array(1))
    const end = () => day.coach.send(finishUpload, { params: { uploadId: upload.id } })
    expect(refusalOf(await last())).toEqual([409, 'upload-dismissed'])
    expect(refusalOf(await end())).toEqual([409, 'upload-dismissed'])
    await change(day.coach, dismissed, false)
    await last().expect(200)
    expect((await finish(day.coach, upload.id)).state).toBe('waiting')
  })
})

describe('what one person has half-way', () => {
  const announce = (client: ApiClient, sizeBytes: number) =>
    client.send(startUpload, {
      params: { sessionId: day.session.id },
      body: { fileName: 'half.csv', sizeBytes },
    })

  /** Somebody who announced so many files of this size before. */
  async function sender(files: number, sizeBytes: number): Promise<ApiClient> {
    const { id, ...member } = await buildMember(harness.db, day.clubId, ['coach'])
    await inDatabase(
      `with made as (insert into club.files (club_id, size_bytes)
         select $1, $4 from generate_series(1, $5) returning id)
       insert into club.uploads (club_id, session_id, file_id, file_name, uploaded_by)
         select $1, $2, id, 'before.csv', $3 from made`,
      [day.clubId, day.session.id, id, sizeBytes, files],
    )
    return harness.signedIn(member)
  }

  it('is so many files at most, however many are announced at once, and dismissing makes room', async () => {
    const coach = await sender(limits.unfinishedUploads - 2, 9)
    const answers = await Promise.all(Array.from({ length: 5 }, () => announce(coach, 9)))
    const refused = answers.filter(({ status }) => status !== 200)
    expect(refused.map(refusalOf)).toEqual(Array.from({ length: 3 }, () => [409, 'too-many-uploads']))
    expect((await announce(day.coach, 9)).status).toBe(200)
    const first = answers.find(({ status }) => status === 200)?.body as Upload
    await change(coach, first, true)
    expect((await announce(coach, 9)).status).toBe(200)
  })

  it('is so many bytes at most', async () => {
    const coach = await sender(limits.unfinishedBytes / limits.fileBytes - 1, limits.fileBytes)
    expect((await announce(coach, limits.fileBytes)).status).toBe(200)
    expect(refusalOf(await announce(coach, 1))).toEqual([409, 'too-many-uploads'])
    expect((await announce(coach, 0)).status).toBe(200)
  })
})
