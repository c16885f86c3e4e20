import { and, eq, isNull, isNotNull, sql } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import { memberships, people } from '../../db/schema/identity.ts'
import { athletes } from '../../db/schema/people-of-club.ts'
import { publications } from '../../db/schema/sessions.ts'
import { analyses, publishedTrials, trials } from '../../db/schema/trials.ts'

/** A trial and its analysis as athletes read them. */
export interface Pin {
  trialId: string
  analysisId: string
  athleteId: string
}

/** What publishing now would pin: trials on an athlete, analysed and not set aside. */
export function pinsToPublish(tx: Tx, clubId: string, sessionId: string): Promise<Pin[]> {
  return tx
    .select({ trialId: trials.id, analysisId: analyses.id, athleteId: sql<string>`${trials.athleteId}` })
    .from(trials)
    .innerJoin(
      analyses,
      and(eq(analyses.clubId, trials.clubId), eq(analyses.trialId, trials.id), isNull(analyses.supersededAt)),
    )
    .where(
      and(
        eq(trials.clubId, clubId),
        eq(trials.sessionId, sessionId),
        isNotNull(trials.athleteId),
        isNull(trials.setAsideAt),
      ),
    )
}

const ofCurrent = (clubId: string, sessionId: string) =>
  and(
    eq(publishedTrials.clubId, clubId),
    eq(publishedTrials.current, true),
    sql`exists (select 1 from club.publications p where p.club_id = published_trials.club_id
      and p.id = published_trials.publication_id and p.session_id = ${sessionId})`,
  )

/** What athletes read of the session now. */
export function currentPins(tx: Tx, clubId: string, sessionId: string): Promise<Pin[]> {
  return tx
    .select({
      trialId: publishedTrials.trialId,
      analysisId: publishedTrials.analysisId,
      athleteId: publishedTrials.athleteId,
    })
    .from(publishedTrials)
    .where(ofCurrent(clubId, sessionId))
}

/** Pins for athletes from now on, in place of an earlier publication's. */
export async function insertPublication(
  tx: Tx,
  publication: { clubId: string; sessionId: string; publishedBy: string; publishedAt: Date },
  pins: Pin[],
): Promise<void> {
  const { clubId, sessionId } = publication
  await tx.update(publishedTrials).set({ current: false }).where(ofCurrent(clubId, sessionId))
  const [{ id: publicationId }] = await tx
    .insert(publications)
    .values(publication)
    .returning({ id: publications.id })
  await tx.insert(publishedTrials).values(pins.map((pin) => ({ clubId, publicationId, ...pin })))
}

/** Who published last. */
export async function lastPublisher(tx: Tx, clubId: string, sessionId: string): Promise<string | null> {
  const [row] = await tx
    .select({ name: people.name })
    .from(publications)
    .innerJoin(people, eq(people.id, publications.publishedBy))
    .where(and(eq(publications.clubId, clubId), eq(publications.sessionId, sessionId)))
    .orderBy(sql`${publications.publishedAt} desc`)
    .limit(1)
  return row?.name ?? null
}

/** Addresses of the people who are these athletes, and whose place in the club is open. */
export function peopleOfAthletes(tx: Tx, clubId: string, athleteIds: string[]) {
  return tx
    .select({ email: people.email, name: people.name })
    .from(athletes)
    .innerJoin(people, eq(people.id, athletes.personId))
    .innerJoin(
      memberships,
      and(
        eq(memberships.clubId, athletes.clubId),
        eq(memberships.personId, athletes.personId),
        memberships.active,
      ),
    )
    .where(and(eq(athletes.clubId, clubId), sql`${athletes.id} = any(${sql.param(athleteIds)}::uuid[])`))
}
