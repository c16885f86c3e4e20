import { createHash } from 'node:crypto'
import type { IncomingMessage } from 'node:http'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { getMe } from '../../shared/contracts/account.ts'
import { limits } from '../../shared/contracts/limits.ts'
import { finishUpload, getOriginal, sendChunk, startUpload } from '../../shared/contracts/uploads.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { refusalOf } from './harness/api-client.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import {
  chunk,
  dropFile,
  finish,
  jumpFile,
  newSession,
  sendFile,
  startTestingDay,
  type TestingDay,
} from './harness/testing-day.ts'
import { until } from './harness/until.ts'

let harness: Harness
let day: TestingDay

beforeAll(async () => {
  harness = await startHarness()
  day = await startTestingDay(harness, ['Mara Ostrow'])
})
afterAll(() => harness.stop())

const announce = (fileName: string, sizeBytes: number) =>
  day.coach.call(startUpload, { params: { sessionId: day.session.id }, body: { fileName, sizeBytes } })

const bytesOf = (length: number, seed = 1) =>
  Uint8Array.from({ length }, (_, i) => (i * 31 + seed * 97 + (i >> 8)) & 0xff)

const countRows = (table: string) =>
  onDatabase(harness.database.adminUrl, async (admin) => {
    const { rows } = await admin.query(`select count(*)::int as n from ${table} where club_id = $1`, [
      day.clubId,
    ])
    return (rows[0] as { n: number }).n
  })

describe('a file is announced', () => {
  it('and waits for its parts', async () => {
    const upload = await announce('mara_ostrow_1.csv', 5)
    expect(upload).toMatchObject({
      fileName: 'mara_ostrow_1.csv',
      sizeBytes: 5,
      state: 'receiving',
      chunksReceived: [],
    })
  })

  it('and a path in its name is left off, with a note', async () => {
    for (const sent of [
      '..\\..\\secret/mara ostrow.csv',
      '/etc/mara ostrow.csv',
      'C:\\day\\mara ostrow.csv',
    ]) {
      const { fileName, notes } = await announce(sent, 5)
      expect(fileName).toBe('mara ostrow.csv')
      expect(notes.map(({ code }) => code)).toEqual(['path-removed'])
    }
  })

  it('and a name of path parts only is refused', async () => {
    const refused = await day.coach.refusal(startUpload, {
      params: { sessionId: day.session.id },
      body: { fileName: '../..', sizeBytes: 5 },
    })
    expect(refused).toEqual([400, 'file-name-invalid'])
  })

  it('and 65 MiB are refused with one sentence, leaving nothing', async () => {
    const before = [await countRows('club.files'), await countRows('club.uploads')]
    const response = await day.coach.send(startUpload, {
      params: { sessionId: day.session.id },
      body: { fileName: 'long.csv', sizeBytes: 65 * 1024 * 1024 },
    })
    expect(refusalOf(response)).toEqual([413, 'file-too-large'])
    expect((response.body as { error: { message: string } }).error.message).toContain('65 MiB')
    expect([await countRows('club.files'), await countRows('club.uploads')]).toEqual(before)
  })

  it('and no session of that id is not here', async () => {
    const params = { sessionId: '00000000-0000-4000-8000-000000000000' }
    expect(
      await day.coach.refusal(startUpload, { params, body: { fileName: 'a.csv', sizeBytes: 1 } }),
    ).toEqual([404, 'not-found'])
  })
})

describe('the parts of a file', () => {
  it('come in any order, repeatable, and make the original byte for byte', async () => {
    const bytes = bytesOf(2 * limits.chunkBytes + 17)
    const upload = await announce('long file.csv', bytes.length)
    const part = (n: number) => bytes.subarray(n * limits.chunkBytes, (n + 1) * limits.chunkBytes)
    for (const n of [2, 0, 2]) await chunk(day.coach, upload.id, n, part(n)).expect(200, { n })
    const early = await day.coach.send(finishUpload, { params: { uploadId: upload.id } })
    expect(refusalOf(early)).toEqual([409, 'upload-incomplete'])
    expect((early.body as { error: { details: unknown } }).error.details).toEqual({ missing: [1] })
    await chunk(day.coach, upload.id, 1, part(1)).expect(200)
    expect((await finish(day.coach, upload.id)).state).toBe('waiting')

    const original = await day.coach.send(getOriginal, { params: { uploadId: upload.id } }).buffer(true)
    expect(
      createHash('sha256')
        .update(original.body as Buffer)
        .digest('hex'),
    ).toBe(createHash('sha256').update(bytes).digest('hex'))
    expect(original.headers).toMatchObject({
      'content-type': 'application/octet-stream',
      'content-length': String(bytes.length),
      'content-disposition': 'attachment; filename="long file.csv"',
      'x-content-type-options': 'nosniff',
    })
  })

  it('keep a name that is no header value out of the header', async () => {
    const upload = await dropFile(day.coach, day.session.id, 'Zoë "1";\tŁukaś.csv', bytesOf(9, 5))
    const { headers } = await day.coach.send(getOriginal, { params: { uploadId: upload.id } })
    expect(headers['content-disposition']).toContain(
      "filename*=UTF-8''Zo%C3%AB%20%221%22%3B%C5%81uka%C5%9B.csv",
    )
  })

  it('must have the length of their place', async () => {
    const { id } = await announce('a.csv', limits.chunkBytes + 10)
    for (const [n, length] of [
      [0, 10],
      [1, 11],
      [1, 0],
      [2, 10],
    ]) {
      expect(refusalOf(await chunk(day.coach, id, n, bytesOf(length)))).toEqual([400, 'chunk-invalid'])
    }
  })

  it('are named by a plain number, and by nothing else that could be read as one', async () => {
    const { id } = await announce('a.csv', 10)
    for (const n of ['0x0', '0.0', '00', '1e0', '-0', '+0', ' 0', '']) {
      const refused = await chunk(day.coach, id, n as unknown as number, bytesOf(10))
      expect([400, 404]).toContain(refused.status)
    }
    await chunk(day.coach, id, 0, bytesOf(10)).expect(200)
  })

  it('may not differ from what came before in their place', async () => {
    const { id } = await announce('a.csv', 10)
    await chunk(day.coach, id, 0, bytesOf(10, 1)).expect(200)
    expect(refusalOf(await chunk(day.coach, id, 0, bytesOf(10, 2)))).toEqual([409, 'chunk-invalid'])
  })

  it('may have 1 MiB, and not a byte more is read', async () => {
    const { id } = await announce('a.csv', 3 * limits.chunkBytes)
    expect(refusalOf(await chunk(day.coach, id, 0, bytesOf(limits.chunkBytes + 1)))).toEqual([
      413,
      'chunk-invalid',
    ])
  })

  it('cannot be added to a finished file', async () => {
    const { id } = await dropFile(day.coach, day.session.id, 'b.csv', bytesOf(10, 3))
    expect(refusalOf(await chunk(day.coach, id, 0, bytesOf(10, 3)))).toEqual([409, 'upload-finished'])
  })

  it.each([
    ['a form without a part', (form: FormData) => form],
    ['a form with a text field', (form: FormData) => (form.set('chunk', 'text'), form)],
    ['a part of another name', (form: FormData) => (form.set('file', new Blob(['1234567890'])), form)],
    [
      'two parts',
      (form: FormData) => {
        form.append('chunk', new Blob(['1234567890']))
        form.append('chunk', new Blob(['1234567890']))
        return form
      },
    ],
  ])('are refused as %s', async (_, fill) => {
    const { id } = await announce('a.csv', 10)
    const form = new Request('http://form/', { method: 'PUT', body: fill(new FormData()) })
    const response = await day.coach
      .send(sendChunk, { params: { uploadId: id, n: 0 } })
      .set('Content-Type', form.headers.get('content-type') ?? '')
      .send(Buffer.from(await form.arrayBuffer()))
    expect(refusalOf(response)).toEqual([400, 'chunk-invalid'])
  })

  it('are refused as anything but a form', async () => {
    const { id } = await announce('a.csv', 10)
    const response = await day.coach.send(sendChunk, { params: { uploadId: id, n: 0 }, body: { chunk: 'x' } })
    expect(refusalOf(response)).toEqual([400, 'chunk-invalid'])
  })

  it('are refused as a form that breaks off', async () => {
    const { id } = await announce('a.csv', 10)
    const response = await day.coach
      .send(sendChunk, { params: { uploadId: id, n: 0 } })
      .set('Content-Type', 'multipart/form-data; boundary=x')
      .send('--x\r\nContent-Disposition: form-data; name="chunk"; filename="c"\r\n\r\n12345')
    expect(refusalOf(response)).toEqual([400, 'chunk-invalid'])
  })
})

describe('an original', () => {
  it('that is not waited for to its end is no fault of the server', async () => {
    const upload = await dropFile(day.coach, day.session.id, 'long.csv', bytesOf(12 * limits.chunkBytes, 21))
    await day.coach
      .send(getOriginal, { params: { uploadId: upload.id } })
      .buffer(true)
      .parse((stream, done) => {
        stream.once('data', () => {
          done(null, '')
          stream.on('error', () => undefined)
          ;(stream as unknown as IncomingMessage).destroy()
        })
      })
    const lines = () => harness.log.filter((line) => line.includes(`${upload.id}/original`))
    await until(
      () => Promise.resolve(lines()),
      (found) => found.some((line) => line.includes('request aborted')),
      { what: 'the end of the request in the log' },
    )
    await day.coach.call(getMe)
    expect(lines().filter((line) => !line.includes('"level":30'))).toEqual([])
  })
})

describe('the same bytes in the same club', () => {
  it('are the same file: known again, stored once', async () => {
    const bytes = bytesOf(3000, 7)
    const first = await dropFile(day.coach, day.session.id, 'first.csv', bytes)
    const chunks = await countRows('club.file_chunks')
    const other = await newSession(day.coach, day.squadId)
    const again = await dropFile(day.coach, other.id, 'second.csv', bytes)
    expect(again).toMatchObject({
      state: 'duplicate',
      fileName: 'second.csv',
      duplicateOf: { uploadId: first.id, sessionId: day.session.id, fileName: 'first.csv' },
    })
    expect(await countRows('club.file_chunks')).toBe(chunks)
    const original = await day.coach.send(getOriginal, { params: { uploadId: again.id } }).buffer(true)
    expect(Buffer.from(bytes).equals(original.body as Buffer)).toBe(true)
  })

  it('are recognised when two finish at once', async () => {
    const bytes = jumpFile(3)
    const sent = await Promise.all(
      ['x.csv', 'y.csv', 'z.csv'].map((name) => sendFile(day.coach, day.session.id, name, bytes)),
    )
    const finished = await Promise.all(sent.map(({ id }) => finish(day.coach, id)))
    expect(finished.map(({ state }) => state).sort()).toEqual(['duplicate', 'duplicate', 'waiting'])
    const first = finished.find(({ state }) => state === 'waiting')
    for (const { state, duplicateOf } of finished) {
      if (state === 'duplicate') expect(duplicateOf?.uploadId).toBe(first?.id)
    }
  })

  it('finish once, however often that is asked for at once', async () => {
    const { id } = await sendFile(day.coach, day.session.id, 'often.csv', bytesOf(500, 11))
    const states = await Promise.all([1, 2, 3].map(async () => (await finish(day.coach, id)).state))
    expect(states).toEqual(['waiting', 'waiting', 'waiting'])
    const jobs = await onDatabase(harness.database.adminUrl, async (admin) => {
      const { rows } = await admin.query(`select 1 from pgboss.job where data ->> 'uploadId' = $1`, [id])
      return rows.length
    })
    expect(jobs).toBe(1)
  })

  it('are another club’s own affair', async () => {
    const bytes = bytesOf(3000, 8)
    await dropFile(day.coach, day.session.id, 'ours.csv', bytes)
    const other = await startTestingDay(harness, [])
    const theirs = await dropFile(other.coach, other.session.id, 'theirs.csv', bytes)
    expect(theirs).toMatchObject({ state: 'waiting', duplicateOf: null })
  })
})
