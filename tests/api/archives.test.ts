import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { SessionSheet } from '../../shared/contracts/sessions.ts'
import { getOriginal } from '../../shared/contracts/uploads.ts'
import { type Form, writePlates } from '../setup/write-c3d.ts'
import { writeWorkbook } from '../setup/write-workbook.ts'
import { writeZip } from '../setup/write-zip.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import { makeJump } from '../../seed/synthetic/jump.ts'
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
  // Machines that check may be busy: the limits of reading have a test of their own.
  worker = await startWorker(harness, { threads: { readTimeLimitMs: 20_000 } })
  day = await startTestingDay(harness, ['Mara Ostrow', 'Zoë Łukaś'])
})
afterAll(async () => {
  await worker.stop()
  await harness.stop()
})

const noise = { whiteNoiseN: 1 }
const recordingOf = (seed: number) => recordJump(makeJump({}, seed), {}, { left: noise, right: noise }, seed)

function workbookFile(seed: number): Uint8Array {
  const { channels, sampleRateHz } = recordingOf(seed)
  const { left = [], right = [] } = channels
  const rows = Array.from(left, (force, i) => [i / sampleRateHz, force, right[i] ?? 0])
  return writeWorkbook([
    { name: 'About', rows: [['Jumps of an invented club']] },
    { name: 'Jump', rows: [['Time (s)', 'Left (N)', 'Right (N)'], ...rows] },
  ])
}

function c3dFile(seed: number, form: Form): Uint8Array {
  const { left = [], right = [] } = recordingOf(seed).channels
  const plate = (force: ArrayLike<number>, foot: string) => ({
    type: 2,
    labels: ['Fx', 'Fy', `${foot} Fz`, 'Mx', 'My', 'Mz'],
    scale: [1, 1, -0.125, 1, 1, 1],
    raw: [0, 1, 2, 3, 4, 5].map((k) =>
      Array.from(force, (newtons) => (k === 2 ? Math.round(8 * newtons) : 0)),
    ),
  })
  return writePlates([plate(left, 'Left'), plate(right, 'Right')], form)
}

const fileOf = (sheet: SessionSheet, name: string) => sheet.uploads.find(({ fileName }) => fileName === name)
const trialOf = (sheet: SessionSheet, name: string) => sheet.trials.find(({ fileName }) => fileName === name)

describe('an archive dropped on a session', () => {
  let sheet: SessionSheet
  const archive = writeZip([
    { name: 'day/' },
    { name: 'day/mara_ostrow_1.csv', data: jumpFile(1) },
    { name: 'day/mara_ostrow_2.csv', data: jumpFile(2), method: 0 },
    { name: 'day/again.csv', data: jumpFile(1) },
    { name: 'day/here before.csv', data: jumpFile(9) },
    { name: 'Zoë Łukaś.xlsx', data: workbookFile(3) },
    { name: 'read me.txt', data: 'Nothing to see here.' },
    { name: 'damaged.csv', data: jumpFile(4), statedCrc: 7 },
    { name: 'inner.zip', data: writeZip([{ name: 'a.csv', data: jumpFile(5) }]) },
    { name: '__MACOSX/day/._mara_ostrow_1.csv', data: 'x' },
  ])

  beforeAll(async () => {
    await dropFile(day.coach, day.session.id, 'first.csv', jumpFile(9))
    await settledSheet(day.coach, day.session.id)
    await dropFile(day.coach, day.session.id, 'day.zip', archive)
    sheet = await settledSheet(day.coach, day.session.id)
  })

  it('becomes a file for each of its recordings, read and on its athlete', () => {
    expect(fileOf(sheet, 'day.zip')).toMatchObject({ state: 'unpacked', trials: 0, archive: null })
    for (const name of ['mara_ostrow_1.csv', 'mara_ostrow_2.csv']) {
      expect(fileOf(sheet, name)).toMatchObject({
        state: 'read',
        trials: 1,
        archive: { uploadId: fileOf(sheet, 'day.zip')?.id, fileName: 'day.zip' },
      })
      expect(trialOf(sheet, name)).toMatchObject({ athleteId: day.athletes['Mara Ostrow'] })
    }
    expect(trialOf(sheet, 'Zoë Łukaś.xlsx')).toMatchObject({ athleteId: day.athletes['Zoë Łukaś'] })
  })

  it('keeps the order of its files, and says what was left out', () => {
    expect(sheet.uploads.map(({ fileName }) => fileName)).toStrictEqual([
      'first.csv',
      'day.zip',
      'mara_ostrow_1.csv',
      'mara_ostrow_2.csv',
      'again.csv',
      'here before.csv',
      'Zoë Łukaś.xlsx',
      'read me.txt',
      'damaged.csv',
      'inner.zip',
    ])
    expect(fileOf(sheet, 'day.zip')?.notes.map(({ sentence }) => sentence)).toStrictEqual([
      'The archive holds 8 files, each read as a file of its own; 1 that computers add by themselves was left out.',
    ])
  })

  it('knows bytes that are here already, in the archive and outside it', () => {
    expect(fileOf(sheet, 'again.csv')).toMatchObject({
      state: 'duplicate',
      duplicateOf: { fileName: 'mara_ostrow_1.csv' },
    })
    expect(fileOf(sheet, 'here before.csv')).toMatchObject({
      state: 'duplicate',
      duplicateOf: { fileName: 'first.csv' },
    })
  })

  it.each([
    ['read me.txt', 'not-a-recording'],
    ['damaged.csv', 'corrupt-file'],
    ['inner.zip', 'unsafe-archive'],
  ])('says of each file that is no recording why: %s', (name, code) => {
    expect(fileOf(sheet, name)).toMatchObject({ state: 'refused', error: { code } })
  })

  it('gives back itself and each of its files byte for byte', async () => {
    for (const [name, bytes] of [
      ['day.zip', archive],
      ['mara_ostrow_1.csv', jumpFile(1)],
      ['mara_ostrow_2.csv', jumpFile(2)],
    ] as const) {
      const { body } = await day.coach
        .send(getOriginal, { params: { uploadId: fileOf(sheet, name)?.id ?? '' } })
        .buffer(true)
        .expect('Content-Length', String(bytes.length))
      expect(Buffer.from(bytes).equals(body as Buffer)).toBe(true)
    }
  })

  it('is recognised by its files when they come again', async () => {
    const again = await dropFile(day.coach, day.session.id, 'mara again.csv', jumpFile(2))
    expect(again).toMatchObject({ state: 'duplicate', duplicateOf: { fileName: 'mara_ostrow_2.csv' } })
  })
})

describe('files of other kinds', () => {
  it('are read as text is: a workbook and a C3D file hold the trials of their recording', async () => {
    const session = await newSession(day.coach, day.squadId)
    await dropFile(day.coach, session.id, 'mara ostrow 1.xlsx', workbookFile(21))
    await dropFile(
      day.coach,
      session.id,
      'mara ostrow 2.c3d',
      c3dFile(22, { processor: 'dec', storage: 'integer' }),
    )
    await dropFile(
      day.coach,
      session.id,
      'mara ostrow 3.c3d',
      c3dFile(23, { processor: 'mips', storage: 'float' }),
    )
    const sheet = await settledSheet(day.coach, session.id)
    expect(sheet.uploads.map(({ state, error }) => error ?? state)).toStrictEqual(['read', 'read', 'read'])
    for (const { analysis } of sheet.trials)
      expect(analysis?.metrics.takeoffVelocity?.value).toBeGreaterThan(2)
  })

  it('are refused with a reason where an archive is not to be opened', async () => {
    const session = await newSession(day.coach, day.squadId)
    const bomb = writeZip([{ name: 'bomb.csv', data: Buffer.alloc(16 * 1024 * 1024) }])
    await dropFile(day.coach, session.id, 'bomb.zip', bomb)
    await dropFile(day.coach, session.id, 'out.zip', writeZip([{ name: '../out.csv', data: 'x' }]))
    await dropFile(day.coach, session.id, 'locked.zip', writeZip([{ name: 'a.csv', data: 'x', flags: 1 }]))
    const { uploads } = await settledSheet(day.coach, session.id)
    expect(uploads.map(({ state, error }) => [state, error?.code])).toStrictEqual([
      ['refused', 'unsafe-archive'],
      ['refused', 'unsafe-archive'],
      ['refused', 'archive-protected'],
    ])
  })
})
