import { createHash } from 'node:crypto'
import type { Response } from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { getSessionArchive, getTrialCsv } from '../../shared/contracts/downloads.ts'
import type { SessionSheet } from '../../shared/contracts/sessions.ts'
import { readRecording } from '../../shared/recordings/read-recording.ts'
import { onDatabase } from '../../server/setup/database-urls.mjs'
import { readDirectory } from '../../server/modules/uploads/archive/directory.ts'
import { unpack } from '../../server/modules/uploads/archive/unpack.ts'
import { writeZip } from '../setup/write-zip.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import { dropFile, jumpFile, settledSheet, startTestingDay, type TestingDay } from './harness/testing-day.ts'
import { startWorker } from './harness/worker.ts'

let harness: Harness
let worker: Awaited<ReturnType<typeof startWorker>>
let day: TestingDay
let sheet: SessionSheet

const note = new TextEncoder().encode('No recording at all.')
const archive = writeZip([{ name: 'u19/zoe lukas 1.csv', data: jumpFile(5) }])

beforeAll(async () => {
  harness = await startHarness()
  worker = await startWorker(harness, { threads: { readTimeLimitMs: 20_000 } })
  day = await startTestingDay(harness, ['Mara Ostrow', 'Zoë Łukaś'])
  const drop = (name: string, bytes: Uint8Array) => dropFile(day.coach, day.session.id, name, bytes)
  await drop('mara ostrow.csv', jumpFile(1))
  await drop('=mara ostrow.csv', jumpFile(2))
  await drop('note.txt', note)
  await drop('Mara Ostrow.CSV', jumpFile(3))
  await drop('day.zip', archive)
  sheet = await settledSheet(day.coach, day.session.id)
})
afterAll(async () => {
  await worker.stop()
  await harness.stop()
})

const asBuffer = (res: Response, done: (error: Error | null, body: Buffer) => void): void => {
  const pieces: Buffer[] = []
  const stream = res as unknown as NodeJS.ReadableStream
  stream.on('data', (piece: Buffer) => pieces.push(piece))
  stream.on('end', () => done(null, Buffer.concat(pieces)))
}

const trialId = (name: string): string => sheet.trials.find(({ fileName }) => fileName === name)?.id ?? ''

describe('the cleaned samples of a trial', () => {
  it('come as CSV that reads back to the very numbers that were analysed', async () => {
    const { body, headers } = await day.coach
      .send(getTrialCsv, { params: { trialId: trialId('mara ostrow.csv') } })
      .buffer(true)
      .parse(asBuffer)
    expect(headers).toMatchObject({
      'content-type': 'text/csv; charset=utf-8',
      'content-disposition': 'attachment; filename="Mara Ostrow - mara ostrow.csv"',
      'x-content-type-options': 'nosniff',
      'cache-control': 'no-store, no-transform',
    })
    const [original, downloaded] = [jumpFile(1), body as Buffer].map((bytes) => readRecording(bytes, 'a.csv'))
    if (!original.ok || !downloaded.ok) throw new Error('One of the two was not read.')
    expect(downloaded.recording.sampleRateHz).toBe(original.recording.sampleRateHz)
    expect(downloaded.recording.channels).toStrictEqual(original.recording.channels)
  })
})

describe('a session as an archive', () => {
  let files: Record<string, Buffer>
  beforeAll(async () => {
    const response = await day.coach
      .send(getSessionArchive, { params: { sessionId: day.session.id } })
      .buffer(true)
      .parse(asBuffer)
    expect(response.headers).toMatchObject({
      'content-type': 'application/zip',
      'content-disposition': 'attachment; filename="2027-02-26 Monthly jumps.zip"',
    })
    const bytes = new Uint8Array(response.body as Buffer)
    const directory = await readDirectory(bytes)
    files = Object.fromEntries(
      directory.files.map((entry) => [entry.path, Buffer.from(unpack(bytes, entry, 2 ** 26))]),
    )
  })

  it('holds the originals byte for byte, the cleaned samples of every trial, and the figures', () => {
    expect(Object.keys(files).sort()).toStrictEqual([
      'figures.csv',
      'originals/=mara ostrow.csv',
      'originals/Mara Ostrow (2).CSV',
      'originals/day.zip',
      'originals/mara ostrow.csv',
      'originals/note.txt',
      'samples/Mara Ostrow - =mara ostrow.csv',
      'samples/Mara Ostrow - Mara Ostrow (2).csv',
      'samples/Mara Ostrow - mara ostrow.csv',
      'samples/Zoë Łukaś - zoe lukas 1.csv',
    ])
    const hash = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex')
    expect(hash(files['originals/mara ostrow.csv'])).toBe(hash(jumpFile(1)))
    expect(hash(files['originals/note.txt'])).toBe(hash(note))
    expect(hash(files['originals/day.zip'])).toBe(hash(archive))
    const read = readRecording(files['samples/Zoë Łukaś - zoe lukas 1.csv'], 'a.csv')
    const original = readRecording(jumpFile(5), 'a.csv')
    expect(read.ok && original.ok && read.recording.channels.left).toStrictEqual(
      original.ok && original.recording.channels.left,
    )
  })

  it('says of each trial its figures with their uncertainty, and no cell is a formula', () => {
    const [head, ...lines] = files['figures.csv'].toString('utf8').trimEnd().split('\r\n')
    expect(lines).toHaveLength(4)
    expect(head).toMatch(/^File,Samples,Athlete,Protocol,Side,/u)
    const headings = head.split(',')
    const line = lines.find((text) => text.startsWith("'=mara ostrow.csv,"))?.split(',') ?? []
    const cell = (heading: string): string => line[headings.indexOf(heading)] ?? ''
    const trial = sheet.trials.find(({ fileName }) => fileName === '=mara ostrow.csv')
    expect(Number(cell('jumpHeightImpulse (m)'))).toBe(trial?.analysis?.metrics.jumpHeightImpulse?.value)
    expect(Number(cell('jumpHeightImpulse U'))).toBe(trial?.analysis?.metrics.jumpHeightImpulse?.U)
    expect(cell('Athlete')).toBe('Mara Ostrow')
  })

  it('is written down as taken', async () => {
    const rows = await onDatabase(harness.database.adminUrl, async (admin) => {
      const found = await admin.query(`select 1 from club.audit_log where action = 'session.download'`)
      return found.rows.length
    })
    expect(rows).toBe(1)
  })
})
