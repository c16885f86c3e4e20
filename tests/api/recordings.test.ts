import type { Response } from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { SessionSheet } from '../../shared/contracts/sessions.ts'
import { getSamples, getTrial } from '../../shared/contracts/trials.ts'
import { getOriginal } from '../../shared/contracts/uploads.ts'
import { readRecording } from '../../shared/recordings/read-recording.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import {
  dropFile,
  jumpFile,
  newSession,
  settledSheet,
  startTestingDay,
  type TestingDay,
} from './harness/testing-day.ts'
import { startWorker } from './harness/worker.ts'

let harness: Harness
let worker: Awaited<ReturnType<typeof startWorker>>
let day: TestingDay

beforeAll(async () => {
  harness = await startHarness()
  worker = await startWorker(harness)
  day = await startTestingDay(harness, ['Mara Ostrow', 'Tomi Ostrow', 'Zoë Łukaś'])
})
afterAll(async () => {
  await worker.stop()
  await harness.stop()
})

const text = (content: string) => new TextEncoder().encode(content)
const picture = Uint8Array.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 0x0d])
const trialOf = (sheet: SessionSheet, fileName: string) =>
  sheet.trials.find((trial) => trial.fileName === fileName)
const fileOf = (sheet: SessionSheet, fileName: string) =>
  sheet.uploads.find((upload) => upload.fileName === fileName)

describe('files dropped on a session', () => {
  let sheet: SessionSheet
  beforeAll(async () => {
    const drop = (name: string, bytes: Uint8Array) => dropFile(day.coach, day.session.id, name, bytes)
    await Promise.all([
      drop('mara_ostrow_1.csv', jumpFile(1)),
      drop('MaraOstrow2.csv', jumpFile(2, { takeoffVelocity: 2.6 })),
      drop('lukas, zoe.csv', jumpFile(3, { massKg: 75.5 })),
      drop('ostrow_3.csv', jumpFile(4)),
      drop('empty.csv', new Uint8Array(0)),
      drop('photo.csv', picture),
      drop('minutes.csv', text('Minutes of the meeting\nNobody came.\n')),
      drop('names.csv', text('Time (s),Name\n0,a\n0.001,b\n0.002,c\n')),
      drop('../../mara ostrow.csv', jumpFile(5)),
    ])
    sheet = await settledSheet(day.coach, day.session.id)
  })

  it('are on the athlete whom their name names, the others in the Tray', () => {
    expect(trialOf(sheet, 'mara_ostrow_1.csv')).toMatchObject({
      athleteId: day.athletes['Mara Ostrow'],
      assignedBy: 'file-name',
    })
    expect(trialOf(sheet, 'MaraOstrow2.csv')?.athleteId).toBe(day.athletes['Mara Ostrow'])
    expect(trialOf(sheet, 'mara ostrow.csv')?.athleteId).toBe(day.athletes['Mara Ostrow'])
    expect(trialOf(sheet, 'lukas, zoe.csv')?.athleteId).toBe(day.athletes['Zoë Łukaś'])
    expect(trialOf(sheet, 'ostrow_3.csv')).toMatchObject({ athleteId: null, assignedBy: null })
    expect(sheet.session).toMatchObject({ athletes: 3, trials: 5, inTray: 1 })
  })

  it('are analysed, with figures that come near the truth', () => {
    const trial = trialOf(sheet, 'MaraOstrow2.csv')
    // The jump was made with 2.6 m/s where its force reaches zero; takeoff is at 10 N, some mm/s before.
    const { takeoffVelocity } = trial?.analysis?.metrics ?? {}
    expect(Math.abs((takeoffVelocity?.value ?? 0) - 2.6)).toBeLessThan(0.03)
    expect(takeoffVelocity?.U).toBeGreaterThan(0)
    expect(trial?.preview.length).toBeGreaterThan(50)
  })

  it('give each athlete means with an uncertainty', () => {
    const mara = sheet.athletes.find(({ name }) => name === 'Mara Ostrow')
    const values = sheet.trials
      .filter(({ athleteId }) => athleteId === mara?.athleteId)
      .map(({ analysis }) => analysis?.metrics.jumpHeightImpulse?.value ?? NaN)
    expect(mara?.means.jumpHeightImpulse?.trials).toBe(3)
    expect(mara?.means.jumpHeightImpulse?.value).toBeCloseTo((values[0] + values[1] + values[2]) / 3, 10)
    expect(mara?.means.jumpHeightImpulse?.U).toBeGreaterThan(0)
    expect(sheet.athletes.find(({ name }) => name === 'Tomi Ostrow')?.means).toEqual({})
  })

  it.each([
    ['empty.csv', 'empty-file'],
    ['photo.csv', 'not-a-recording'],
    ['minutes.csv', 'not-a-recording'],
    ['names.csv', 'no-force-column'],
  ])('are refused with a sentence and a remedy where they are no recording: %s', (fileName, code) => {
    const upload = fileOf(sheet, fileName)
    expect(upload).toMatchObject({ state: 'refused', trials: 0, error: { code } })
    expect(upload?.error?.sentence).toMatch(/^[A-Z].*\.$/)
    expect(upload?.error?.remedy).toMatch(/^[A-Z].*\.$/)
  })

  it('come back byte for byte, refused ones too', async () => {
    for (const [name, bytes] of [
      ['mara_ostrow_1.csv', jumpFile(1)],
      ['photo.csv', picture],
      ['empty.csv', new Uint8Array(0)],
    ] as const) {
      const uploadId = fileOf(sheet, name)?.id ?? ''
      const original = await day.coach
        .send(getOriginal, { params: { uploadId } })
        .buffer(true)
        .parse(asBuffer)
      expect(Buffer.from(bytes).equals(original.body as Buffer)).toBe(true)
    }
  })

  it('keep the note of a path that was left off', () => {
    expect(fileOf(sheet, 'mara ostrow.csv')?.notes.map(({ code }) => code)).toContain('path-removed')
  })

  it('open as a trial: events, ledger, checks, every metric, its neighbours', async () => {
    const id = trialOf(sheet, 'MaraOstrow2.csv')?.id ?? ''
    const trial = await day.coach.call(getTrial, { params: { trialId: id } })
    expect(trial).toMatchObject({
      sessionId: day.session.id,
      fileName: 'MaraOstrow2.csv',
      athlete: { name: 'Mara Ostrow' },
      recording: { sampleRateHz: 1000, sampleCount: 6000, channels: ['left', 'right'] },
      mayEdit: true,
    })
    expect(trial.placeInSession?.of).toBe(3)
    expect(Object.keys(trial.analysis?.events ?? {})).toEqual(
      expect.arrayContaining(['onset', 'takeoff', 'touchdown']),
    )
    expect(trial.analysis?.ledger?.entries.map(({ phase }) => phase).slice(0, 4)).toEqual([
      'unweighting',
      'braking',
      'propulsion',
      'flight',
    ])
    expect(trial.analysis?.checks.length).toBeGreaterThan(5)
    expect(Object.keys(trial.analysis?.metrics ?? {}).length).toBeGreaterThan(20)
  })

  it('form one line of trials, by athlete, from the first to the Tray', async () => {
    const walked: string[] = []
    for (let next: string | null = sheet.trials[0].id; next;) {
      walked.push(next)
      next = (await day.coach.call(getTrial, { params: { trialId: next } })).nextTrialId
    }
    expect(walked).toEqual(sheet.trials.map(({ id }) => id))
    expect(sheet.trials.at(-1)?.fileName).toBe('ostrow_3.csv')
  })

  it('give their samples as the very millinewtons that were read', async () => {
    const params = { trialId: trialOf(sheet, 'mara_ostrow_1.csv')?.id ?? '' }
    const answer = await day.coach.send(getSamples, { params }).buffer(true).parse(asBuffer)
    const bytes = answer.body as Buffer
    const read = readRecording(jumpFile(1), 'mara_ostrow_1.csv')
    if (!read.ok) throw new Error('the file is a recording')
    const { left, right } = read.recording.channels
    expect(bytes.length).toBe(2 * 4 * 6000)
    expect(bytes.readInt32LE(4 * 1234)).toBe(Math.round((left?.[1234] ?? NaN) * 1000))
    expect(bytes.readInt32LE(4 * (6000 + 4321))).toBe(Math.round((right?.[4321] ?? NaN) * 1000))
  })
})

describe('a recording without a jump', () => {
  it('is kept, and its trial says so', async () => {
    const session = await newSession(day.coach, day.squadId)
    const lines = Array.from({ length: 3000 }, (_, i) => `${i / 1000},${700 + (i % 3)}`)
    await dropFile(
      day.coach,
      session.id,
      'mara_ostrow.csv',
      text(`Time (s),Force (N)\n${lines.join('\n')}\n`),
    )
    const { trials, athletes } = await settledSheet(day.coach, session.id)
    expect(trials[0].analysis).toMatchObject({ metrics: {}, fails: 1 })
    expect(trials[0].analysis?.worstSentence).toMatch(/No flight was found/)
    expect(athletes.every(({ means }) => Object.keys(means).length === 0)).toBe(true)
  })
})

describe('a refused file that comes again', () => {
  it('is read again, since reading may have learnt it meanwhile', async () => {
    const session = await newSession(day.coach, day.squadId)
    await dropFile(day.coach, session.id, 'again.csv', text('no numbers, whoever reads it'))
    await settledSheet(day.coach, session.id)
    await dropFile(day.coach, session.id, 'again.csv', text('no numbers, whoever reads it'))
    const { uploads } = await settledSheet(day.coach, session.id)
    expect(uploads.map(({ state }) => state)).toEqual(['refused', 'refused'])
  })
})

/** supertest reads text by default; these are bytes, an empty file's as well. */
function asBuffer(res: Response, done: (error: Error | null, body: Buffer) => void): void {
  const parts: Buffer[] = []
  const stream = res as unknown as NodeJS.ReadableStream
  stream.on('data', (part: Buffer) => parts.push(part))
  stream.on('end', () => done(null, Buffer.concat(parts)))
}
