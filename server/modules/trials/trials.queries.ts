import { and, asc, eq, isNull, sql } from 'drizzle-orm'
import { alias } from 'drizzle-orm/pg-core'
import type { Test } from '../../../shared/contracts/tests.ts'
import type { Tx } from '../../db/database.ts'
import { people } from '../../db/schema/identity.ts'
import { athletes } from '../../db/schema/people-of-club.ts'
import { sessions } from '../../db/schema/sessions.ts'
import { analyses, publishedTrials, trials, trialSamples } from '../../db/schema/trials.ts'
import { uploads } from '../../db/schema/uploads.ts'

const setAsideBy = alias(people, 'set_aside_by')

const columns = {
  id: trials.id,
  sessionId: trials.sessionId,
  uploadId: trials.uploadId,
  fileName: uploads.fileName,
  athleteId: trials.athleteId,
  athleteName: athletes.name,
  assignedBy: sql<'file-name' | 'hand' | null>`${trials.assignedBy}`,
  test: {
    protocol: sql<Test['protocol']>`${trials.protocol}`,
    side: sql<Test['side']>`${trials.side}`,
    externalLoadKg: trials.externalLoadKg,
    boxHeightM: trials.boxHeightM,
    arms: sql<Test['arms']>`${trials.arms}`,
  },
  setAsideReason: trials.setAsideReason,
  setAsideByName: setAsideBy.name,
  version: trials.version,
}

/** Order of the sheet: athletes by name, the Tray last, trials as they came. */
const sheetOrder = [
  sql`${athletes.nameKey} asc nulls last`,
  asc(trials.athleteId),
  asc(trials.droppedAt),
  asc(trials.ordinal),
  asc(trials.id),
]

/** A session's trials in the order of the sheet, each with its current analysis. */
export function sheetTrials(tx: Tx, clubId: string, sessionId: string) {
  return tx
    .select({
      ...columns,
      preview: trials.preview,
      analysis: {
        id: analyses.id,
        metricValues: analyses.metricValues,
        metricUncertainties: analyses.metricUncertainties,
        checks: analyses.checks,
      },
    })
    .from(trials)
    .innerJoin(uploads, and(eq(uploads.clubId, trials.clubId), eq(uploads.id, trials.uploadId)))
    .leftJoin(athletes, and(eq(athletes.clubId, trials.clubId), eq(athletes.id, trials.athleteId)))
    .leftJoin(setAsideBy, eq(setAsideBy.id, trials.setAsideBy))
    .leftJoin(
      analyses,
      and(eq(analyses.clubId, trials.clubId), eq(analyses.trialId, trials.id), isNull(analyses.supersededAt)),
    )
    .where(and(eq(trials.clubId, clubId), eq(trials.sessionId, sessionId)))
    .orderBy(...sheetOrder)
}
export type SheetTrialRow = Awaited<ReturnType<typeof sheetTrials>>[number]

const page = {
  ...columns,
  sessionTitle: sessions.title,
  sessionDate: sessions.date,
  place: sessions.place,
  recording: {
    sampleRateHz: trialSamples.sampleRateHz,
    sampleCount: trialSamples.sampleCount,
    channels: sql<('left' | 'right' | 'single' | 'total')[]>`${trialSamples.channels}`,
    filledSamples: trialSamples.filledSamples,
    timeBaseError: trialSamples.timeBaseError,
  },
  sessionBy: sessions.createdBy,
}

/** A trial for staff. */
export async function findTrial(tx: Tx, clubId: string, trialId: string) {
  const [row] = await tx
    .select(page)
    .from(trials)
    .innerJoin(sessions, and(eq(sessions.clubId, trials.clubId), eq(sessions.id, trials.sessionId)))
    .innerJoin(uploads, and(eq(uploads.clubId, trials.clubId), eq(uploads.id, trials.uploadId)))
    .innerJoin(trialSamples, and(eq(trialSamples.clubId, trials.clubId), eq(trialSamples.trialId, trials.id)))
    .leftJoin(athletes, and(eq(athletes.clubId, trials.clubId), eq(athletes.id, trials.athleteId)))
    .leftJoin(setAsideBy, eq(setAsideBy.id, trials.setAsideBy))
    .where(and(eq(trials.clubId, clubId), eq(trials.id, trialId)))
  return row ?? null
}
export type TrialPageRow = NonNullable<Awaited<ReturnType<typeof findTrial>>>

/** The athlete's own trial as it was published, with the pinned analysis; its file is the club's affair. */
export async function findOwnTrial(tx: Tx, clubId: string, athleteId: string, trialId: string) {
  const [row] = await tx
    .select({
      ...page,
      // That of the day: the session may have been put to another test since.
      test: sql<Test>`${analyses.inputs} -> 'test'`,
      fileName: sql<null>`null`,
      setAsideByName: sql<null>`null`,
      analysisId: publishedTrials.analysisId,
    })
    .from(publishedTrials)
    .innerJoin(trials, and(eq(trials.clubId, publishedTrials.clubId), eq(trials.id, publishedTrials.trialId)))
    .innerJoin(
      analyses,
      and(eq(analyses.clubId, publishedTrials.clubId), eq(analyses.id, publishedTrials.analysisId)),
    )
    .innerJoin(sessions, and(eq(sessions.clubId, trials.clubId), eq(sessions.id, trials.sessionId)))
    .innerJoin(trialSamples, and(eq(trialSamples.clubId, trials.clubId), eq(trialSamples.trialId, trials.id)))
    .innerJoin(
      athletes,
      and(eq(athletes.clubId, publishedTrials.clubId), eq(athletes.id, publishedTrials.athleteId)),
    )
    .where(
      and(
        eq(publishedTrials.clubId, clubId),
        eq(publishedTrials.athleteId, athleteId),
        eq(publishedTrials.trialId, trialId),
        eq(publishedTrials.current, true),
      ),
    )
  return row ?? null
}

export interface Neighbour {
  id: string
  athleteId: string | null
}

/** The session's trials in the order of the sheet. */
export function sheetOrderOf(tx: Tx, clubId: string, sessionId: string): Promise<Neighbour[]> {
  return tx
    .select({ id: trials.id, athleteId: trials.athleteId })
    .from(trials)
    .leftJoin(athletes, and(eq(athletes.clubId, trials.clubId), eq(athletes.id, trials.athleteId)))
    .where(and(eq(trials.clubId, clubId), eq(trials.sessionId, sessionId)))
    .orderBy(...sheetOrder)
}

/** The athlete's published trials of a session, as they came. */
export function ownOrderOf(
  tx: Tx,
  clubId: string,
  athleteId: string,
  sessionId: string,
): Promise<Neighbour[]> {
  return tx
    .select({ id: trials.id, athleteId: sql<string>`${publishedTrials.athleteId}` })
    .from(publishedTrials)
    .innerJoin(trials, and(eq(trials.clubId, publishedTrials.clubId), eq(trials.id, publishedTrials.trialId)))
    .where(
      and(
        eq(publishedTrials.clubId, clubId),
        eq(publishedTrials.athleteId, athleteId),
        eq(publishedTrials.current, true),
        eq(trials.sessionId, sessionId),
      ),
    )
    .orderBy(asc(trials.droppedAt), asc(trials.ordinal), asc(trials.id))
}

export async function findSamples(tx: Tx, clubId: string, trialId: string) {
  const [row] = await tx
    .select({ bytes: trialSamples.bytes, encoding: trialSamples.encoding })
    .from(trialSamples)
    .where(and(eq(trialSamples.clubId, clubId), eq(trialSamples.trialId, trialId)))
  return row ?? null
}

export async function insertTrial(
  tx: Tx,
  trial: typeof trials.$inferInsert,
  samples: Omit<typeof trialSamples.$inferInsert, 'clubId' | 'trialId'>,
): Promise<string> {
  const [{ id }] = await tx.insert(trials).values(trial).returning({ id: trials.id })
  await tx.insert(trialSamples).values({ clubId: trial.clubId, trialId: id, ...samples })
  return id
}

export type TrialChange = Partial<
  Pick<
    typeof trials.$inferInsert,
    'athleteId' | 'assignedBy' | 'setAsideReason' | 'setAsideBy' | 'setAsideAt'
  >
>

/** Changes the trial if it still is of that version; false if not. */
export async function updateTrial(
  tx: Tx,
  { clubId, trialId, version }: { clubId: string; trialId: string; version: number },
  change: TrialChange,
): Promise<boolean> {
  const changed = await tx
    .update(trials)
    .set({ ...change, version: sql`${trials.version} + 1` })
    .where(and(eq(trials.clubId, clubId), eq(trials.id, trialId), eq(trials.version, version)))
    .returning({ id: trials.id })
  return changed.length > 0
}
