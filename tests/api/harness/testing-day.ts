import type { Test } from 'supertest'
import {
  createSession,
  getSession,
  type SessionSheet,
  type SessionSummary,
} from '../../../shared/contracts/sessions.ts'
import { usualTest } from '../../../shared/contracts/session-test.ts'
import { limits } from '../../../shared/contracts/limits.ts'
import { finishUpload, sendChunk, startUpload, type Upload } from '../../../shared/contracts/uploads.ts'
import { buildAthlete, buildSquad } from '../../../seed/builders/athlete.ts'
import { buildClub } from '../../../seed/builders/club.ts'
import { buildMember } from '../../../seed/builders/person.ts'
import { makeJump } from '../../../seed/synthetic/jump.ts'
import type { JumpOptions } from '../../../seed/synthetic/options.ts'
import { recordJump } from '../../../seed/synthetic/record.ts'
import { writeDelimited } from '../../../seed/synthetic/write-delimited.ts'
import type { ApiClient } from './api-client.ts'
import type { Harness } from './harness.ts'
import { until } from './until.ts'

export interface TestingDay {
  clubId: string
  squadId: string
  /** Name → id. */
  athletes: Record<string, string>
  coach: ApiClient
  session: SessionSummary
}

/** A club with a coach, a squad of these athletes (75 kg each) and a session for it. */
export async function startTestingDay(
  harness: Pick<Harness, 'db' | 'signedIn'>,
  names: string[],
): Promise<TestingDay> {
  const clubId = await buildClub(harness.db)
  const squadId = await buildSquad(harness.db, clubId)
  const athletes: Record<string, string> = {}
  for (const name of names) {
    athletes[name] = await buildAthlete(harness.db, clubId, { name, recordedMassKg: 75, squadIds: [squadId] })
  }
  const coach = await harness.signedIn(await buildMember(harness.db, clubId, ['coach']))
  return { clubId, squadId, athletes, coach, session: await newSession(coach, squadId) }
}

export const newSession = (coach: ApiClient, squadId: string, date = '2027-02-26'): Promise<SessionSummary> =>
  coach.call(createSession, {
    body: {
      date,
      title: 'Monthly jumps',
      place: 'Hall',
      note: null,
      test: usualTest('cmj'),
      squadIds: [squadId],
    },
  })

/** The file of a countermovement jump, made from physics; each seed is another file. */
export function jumpFile(seed: number, jump: Partial<JumpOptions> = {}): Uint8Array {
  const noise = { whiteNoiseN: 1 }
  return writeDelimited(recordJump(makeJump(jump, seed), {}, { left: noise, right: noise }, seed))
}

/** Announces the file and sends its chunks. */
export async function sendFile(
  client: ApiClient,
  sessionId: string,
  fileName: string,
  bytes: Uint8Array,
): Promise<Upload> {
  const body = { fileName, sizeBytes: bytes.length }
  const upload = await client.call(startUpload, { params: { sessionId }, body })
  for (let n = 0; n * limits.chunkBytes < bytes.length; n++) {
    const part = bytes.subarray(n * limits.chunkBytes, (n + 1) * limits.chunkBytes)
    await chunk(client, upload.id, n, part).expect(200)
  }
  return upload
}

export const chunk = (client: ApiClient, uploadId: string, n: number, bytes: Uint8Array): Test =>
  client.send(sendChunk, { params: { uploadId, n } }).attach('chunk', Buffer.from(bytes), 'chunk')

export const finish = (client: ApiClient, uploadId: string): Promise<Upload> =>
  client.call(finishUpload, { params: { uploadId } })

/** Drops a file on the session, to its end. */
export async function dropFile(
  client: ApiClient,
  sessionId: string,
  fileName: string,
  bytes: Uint8Array,
): Promise<Upload> {
  return finish(client, (await sendFile(client, sessionId, fileName, bytes)).id)
}

/** The sheet once every file is read or refused and every trial analysed. */
export const settledSheet = (client: ApiClient, sessionId: string): Promise<SessionSheet> =>
  until(
    () => client.call(getSession, { params: { sessionId } }),
    ({ uploads, trials }) =>
      uploads.every(({ state }) => state !== 'waiting') && trials.every(({ analysis }) => analysis !== null),
    { what: 'every file read and every trial analysed' },
  )
