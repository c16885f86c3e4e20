import { randomUUID } from 'node:crypto'
import { and, eq, sql } from 'drizzle-orm'
import { getTableConfig, type PgTable } from 'drizzle-orm/pg-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { databaseErrorOf } from '../../server/db/constraint-errors.ts'
import type { ClubContext, Database, Tx } from '../../server/db/database.ts'
import { workerContext } from '../../server/db/database.ts'
import * as billing from '../../server/db/schema/billing.ts'
import * as identity from '../../server/db/schema/identity.ts'
import * as measuring from '../../server/db/schema/measuring.ts'
import * as peopleOfClub from '../../server/db/schema/people-of-club.ts'
import * as recomputes from '../../server/db/schema/recomputes.ts'
import * as records from '../../server/db/schema/records.ts'
import * as results from '../../server/db/schema/results.ts'
import * as seats from '../../server/db/schema/seats.ts'
import * as sessions from '../../server/db/schema/sessions.ts'
import * as trials from '../../server/db/schema/trials.ts'
import * as uploads from '../../server/db/schema/uploads.ts'
import { buildAthlete } from '../../seed/builders/athlete.ts'
import { buildMember } from '../../seed/builders/person.ts'
import { buildSession } from '../../seed/builders/session.ts'
import { buildAnalysis, buildPublication, buildTrial, buildUpload } from '../../seed/builders/trial.ts'
import { startHarness, type Harness } from './harness/harness.ts'
import { buildOneOfEach, type OneOfEach } from './harness/one-of-each.ts'

let harness: Harness
let own: OneOfEach
let other: OneOfEach

beforeAll(async () => {
  harness = await startHarness()
  own = await buildOneOfEach(harness)
  other = await buildOneOfEach(harness)
  await fillTheRest()
})
afterAll(() => harness.stop())

/** Rows of the own club in the tables that one of each leaves empty. */
async function fillTheRest(): Promise<void> {
  const { clubId, personId, sessionId, trialId, analysisId, athleteId } = own
  const pin = { sessionId, publishedBy: personId, trialId, analysisId, athleteId }
  await buildPublication(harness.db, clubId, pin)
  const ctx: ClubContext = { clubId, personId, capabilities: ['staff'] }
  await harness.db.inClub(ctx, async (tx) => {
    const key = { key: randomUUID(), route: 'POST /', requestHash: Buffer.alloc(32) }
    await tx.insert(records.idempotencyKeys).values({ clubId, personId, ...key })
    await tx.insert(results.sessionResults).values(resultRow(own, athleteId, 'working'))
    const spread = { testKey: 'cmj/both/0kg/-/hips', edition: 'working', spreads: {} }
    const move = { events: {}, stood: {}, movedBy: personId, movedAt: new Date() }
    await tx.insert(trials.eventMoves).values({ clubId, trialId, ...move })
    await tx.insert(results.trialSpreads).values({ clubId, sessionId, ...spread })
    const edition = { clubId, edition: 2, changedBy: personId }
    await tx.insert(measuring.measuringSettings).values({ ...edition, changed: { eventForceN: 20 } })
    const plates = { leftU: 0.005, rightU: 0.005, singleU: 0.005, totalU: 0.005 }
    await tx.insert(measuring.plateCalibrations).values({ ...edition, ...plates })
    await tx.insert(billing.standings).values({ clubId })
    await tx.insert(seats.seatWaits).values({ clubId, athleteId, since: new Date() })
    await tx.insert(seats.seatRules).values({ clubId, byItself: true })
  })
  await harness.db.inClub(workerContext(clubId), async (tx) => {
    await tx.insert(billing.subscriptions).values({ clubId })
    await tx.insert(billing.billingNotices).values({ clubId, key: 'receipt:in_1' })
  })
}

const resultRow = (
  { clubId, sessionId, trialId, analysisId }: OneOfEach,
  athleteId: string,
  edition: string,
) => ({
  clubId,
  sessionId,
  athleteId,
  edition,
  testKey: 'cmj/both/0kg/-/hips',
  protocol: 'cmj',
  side: 'both',
  externalLoadKg: 0,
  arms: 'hips',
  sessionDate: '2027-02-01',
  trialIds: [trialId],
  analysisIds: [analysisId],
  metricValues: {},
  metricU: {},
  metricURepeat: {},
})

const isTable = (value: unknown): value is PgTable =>
  typeof value === 'object' && value !== null && Symbol.for('drizzle:IsDrizzleTable') in value
const clubTables = [
  billing,
  peopleOfClub,
  measuring,
  recomputes,
  records,
  results,
  seats,
  sessions,
  trials,
  uploads,
]
  .flatMap((schema) => Object.values(schema) as unknown[])
  .filter(isTable)
const nameOf = (table: PgTable) => getTableConfig(table).name

/** The SQLSTATE that a statement is refused with, or 'done'. */
async function refusal(db: Database, ctx: ClubContext, statement: (tx: Tx) => Promise<unknown>) {
  try {
    await db.inClub(ctx, statement)
    return 'done'
  } catch (error) {
    return databaseErrorOf(error)?.code ?? String(error)
  }
}
const insufficientPrivilege = '42501'
const foreignKeyViolation = '23503'

describe('rows of a club', () => {
  // Web may write the log of who did what, and never read it.
  const readable = clubTables.filter((table) => nameOf(table) !== 'audit_log')

  it.each(readable.map((table) => [nameOf(table), table] as const))(
    'in %s are seen by their own club alone',
    async (_, table) => {
      // The same person asks for both clubs, with every capability: only the club differs.
      const look = (clubId: string) =>
        harness.db.inClub(
          { clubId, personId: own.personId, capabilities: ['staff', 'physio', 'admin'] },
          (tx) => tx.execute(sql`select 1 from ${table} where club_id = ${own.clubId}`),
        )
      expect((await look(own.clubId)).rows.length).toBeGreaterThan(0)
      expect((await look(other.clubId)).rows).toEqual([])
    },
  )

  it('are not seen at all without a club', async () => {
    for (const table of readable) {
      const { rows } = await harness.db.pool.query(`select 1 from club."${nameOf(table)}" limit 1`)
      expect(rows, nameOf(table)).toEqual([])
    }
  })

  it('are not seen by the role of identity', async () => {
    const look = harness.db.inIdentity((tx) => tx.execute(sql`select 1 from club.athletes`))
    await expect(look).rejects.toSatisfy((error) => databaseErrorOf(error)?.code === insufficientPrivilege)
  })

  it('cannot be written for another club', async () => {
    const row = { clubId: own.clubId, name: 'Intruders' }
    expect(
      await refusal(harness.db, workerContext(other.clubId), (tx) =>
        tx.insert(peopleOfClub.squads).values(row),
      ),
    ).toBe(insufficientPrivilege)
    const changed = await harness.db.inClub(workerContext(other.clubId), (tx) =>
      tx
        .update(peopleOfClub.athletes)
        .set({ name: 'Taken' })
        .where(eq(peopleOfClub.athletes.id, own.athleteId))
        .returning(),
    )
    expect(changed).toEqual([])
  })

  it('cannot hang on rows of another club: foreign keys carry the club', async () => {
    const clubId = other.clubId
    const line = { clubId, squadId: other.squadId, athleteId: own.athleteId }
    expect(
      await refusal(harness.db, workerContext(clubId), (tx) =>
        tx.insert(peopleOfClub.squadMembers).values(line),
      ),
    ).toBe(foreignKeyViolation)
    const session = { clubId, date: '2027-01-01', title: 'x', protocol: 'cmj', createdBy: own.personId }
    expect(
      await refusal(harness.db, workerContext(clubId), (tx) => tx.insert(sessions.sessions).values(session)),
    ).toBe(foreignKeyViolation)
  })

  it('are deleted by neither web nor worker where a person gave them', async () => {
    for (const table of [peopleOfClub.athletes, sessions.sessions, uploads.uploads, trials.trials]) {
      for (const db of [harness.db, harness.workerDeps.db]) {
        const outcome = await refusal(db, workerContext(own.clubId), (tx) =>
          tx.execute(sql`delete from ${table} where false`),
        )
        expect(outcome, nameOf(table)).toBe(insufficientPrivilege)
      }
    }
  })

  it('keep the bytes of every finished file', async () => {
    const deleted = await harness.db.inClub(workerContext(own.clubId), async (tx) => [
      ...(await tx.delete(uploads.fileChunks).returning({ n: uploads.fileChunks.n })),
      ...(await tx.delete(uploads.files).returning({ id: uploads.files.id })),
    ])
    expect(deleted).toEqual([])
  })

  it('of moved events are never rewritten', async () => {
    const rewrite = (db: Database) =>
      refusal(db, workerContext(own.clubId), (tx) =>
        tx.update(trials.eventMoves).set({ reason: 'Another reason' }),
      )
    expect([await rewrite(harness.db), await rewrite(harness.workerDeps.db)]).toEqual([
      insufficientPrivilege,
      insufficientPrivilege,
    ])
  })

  it('of analyses are never rewritten, by web or by worker', async () => {
    const rewrite = (db: Database) =>
      refusal(db, workerContext(own.clubId), (tx) =>
        tx.update(trials.analyses).set({ metricValues: { jumpHeightImpulse: 9 } }),
      )
    expect([await rewrite(harness.db), await rewrite(harness.workerDeps.db)]).toEqual([
      insufficientPrivilege,
      insufficientPrivilege,
    ])
  })
})

describe('people', () => {
  it('of another club are not seen, and nobody’s password is', async () => {
    const seen = await harness.db.inClub(workerContext(other.clubId), (tx) =>
      tx.select({ id: identity.people.id }).from(identity.people),
    )
    expect(seen.map(({ id }) => id)).toEqual([other.personId])
    expect(
      await refusal(harness.db, workerContext(own.clubId), (tx) =>
        tx.select({ hash: identity.people.passwordHash }).from(identity.people),
      ),
    ).toBe(insufficientPrivilege)
  })

  it('are invited by admins alone, in the database too', async () => {
    const coach: ClubContext = { clubId: own.clubId, personId: own.personId, capabilities: ['staff'] }
    const seen = await harness.db.inClub(coach, (tx) => tx.select().from(identity.invitations))
    expect(seen).toEqual([])
  })
})

describe('an athlete', () => {
  /** An athlete with two trials, one of them published, and a team mate with a published one. */
  async function publishedAndNot() {
    const { clubId, sessionId, personId: coachId } = own
    const { db, workerDeps } = harness
    const person = await buildMember(db, clubId, ['athlete'])
    const athleteId = await buildAthlete(db, clubId, { personId: person.id })
    const mateId = await buildAthlete(db, clubId)
    const made: Record<'published' | 'unpublished' | 'mates', { trialId: string; analysisId: string }> = {
      published: await trialOf(athleteId, true),
      unpublished: await trialOf(athleteId, false),
      mates: await trialOf(mateId, true),
    }
    async function trialOf(whose: string, publish: boolean) {
      const uploadId = await buildUpload(db, clubId, { sessionId, uploadedBy: coachId })
      const trialId = await buildTrial(db, clubId, { sessionId, uploadId, athleteId: whose })
      const analysisId = await buildAnalysis(workerDeps.db, clubId, { trialId })
      const pin = { sessionId, publishedBy: coachId, trialId, analysisId, athleteId: whose }
      if (publish) await buildPublication(db, clubId, pin)
      return { trialId, analysisId }
    }
    const ctx: ClubContext = { clubId, personId: person.id, capabilities: [] }
    return { ctx, athleteId, ...made }
  }

  it('sees their own published trials, samples and analyses, and no others', async () => {
    const { ctx, athleteId, published } = await publishedAndNot()
    await harness.db.inClub(ctx, async (tx) => {
      const athletes = await tx.select({ id: peopleOfClub.athletes.id }).from(peopleOfClub.athletes)
      expect(athletes).toEqual([{ id: athleteId }])
      expect(await tx.select({ id: trials.trials.id }).from(trials.trials)).toEqual([
        { id: published.trialId },
      ])
      expect(await tx.select({ id: trials.trialSamples.trialId }).from(trials.trialSamples)).toEqual([
        { id: published.trialId },
      ])
      expect(await tx.select({ id: trials.analyses.id }).from(trials.analyses)).toEqual([
        { id: published.analysisId },
      ])
    })
  })

  it('sees the published edition of their results and not the sheet as it stands', async () => {
    const { ctx, athleteId } = await publishedAndNot()
    const editions = ['working', 'published'].map((edition) => resultRow(own, athleteId, edition))
    await harness.db.inClub(workerContext(own.clubId), (tx) =>
      tx.insert(results.sessionResults).values(editions),
    )
    const seen = await harness.db.inClub(ctx, (tx) =>
      tx.select({ edition: results.sessionResults.edition }).from(results.sessionResults),
    )
    expect(seen).toEqual([{ edition: 'published' }])
  })

  it('sees no file, no upload and no unpublished session, and writes nothing', async () => {
    const { ctx, athleteId } = await publishedAndNot()
    await buildSession(harness.db, own.clubId, { createdBy: own.personId })
    await harness.db.inClub(ctx, async (tx) => {
      expect(await tx.select().from(uploads.uploads)).toEqual([])
      expect(await tx.select().from(uploads.fileChunks)).toEqual([])
      expect(await tx.select().from(sessions.sessions)).toEqual([])
    })
    const rename = (tx: Tx) =>
      tx
        .update(peopleOfClub.athletes)
        .set({ name: 'Myself' })
        .where(and(eq(peopleOfClub.athletes.clubId, own.clubId), eq(peopleOfClub.athletes.id, athleteId)))
    expect(await refusal(harness.db, ctx, rename)).toBe(insufficientPrivilege)
    const squad = { clubId: own.clubId, name: `Mine ${randomUUID()}` }
    expect(await refusal(harness.db, ctx, (tx) => tx.insert(peopleOfClub.squads).values(squad))).toBe(
      insufficientPrivilege,
    )
  })
})
