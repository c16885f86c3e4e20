import { and, desc, eq, inArray, isNotNull, isNull, sql } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import { people } from '../../db/schema/identity.ts'
import { athletes } from '../../db/schema/people-of-club.ts'
import { type Moves, recomputeBatches, recomputes } from '../../db/schema/recomputes.ts'
import { sessions } from '../../db/schema/sessions.ts'
import { trials } from '../../db/schema/trials.ts'

const openStates = ['waiting', 'running']
const listed = 50

const columns = {
  id: recomputes.id,
  scope: recomputes.scope,
  sessionId: recomputes.sessionId,
  athleteId: recomputes.athleteId,
  sessionTitle: sessions.title,
  athleteName: athletes.name,
  dryRun: recomputes.dryRun,
  state: recomputes.state,
  total: recomputes.total,
  done: recomputes.done,
  engineVersion: recomputes.engineVersion,
  requestedByName: people.name,
  createdAt: recomputes.createdAt,
  finishedAt: recomputes.finishedAt,
}

const select = (tx: Tx) =>
  tx
    .select(columns)
    .from(recomputes)
    .leftJoin(sessions, and(eq(sessions.clubId, recomputes.clubId), eq(sessions.id, recomputes.sessionId)))
    .leftJoin(athletes, and(eq(athletes.clubId, recomputes.clubId), eq(athletes.id, recomputes.athleteId)))
    .leftJoin(people, eq(people.id, recomputes.requestedBy))
export type RecomputeRow = Awaited<ReturnType<typeof select>>[number]

export async function findRecompute(tx: Tx, clubId: string, id: string): Promise<RecomputeRow | null> {
  const [row] = await select(tx).where(and(eq(recomputes.clubId, clubId), eq(recomputes.id, id)))
  return row ?? null
}

/** The club's recompute that waits or runs. */
export async function findOpen(tx: Tx, clubId: string): Promise<RecomputeRow | null> {
  const [row] = await select(tx).where(
    and(eq(recomputes.clubId, clubId), inArray(recomputes.state, openStates)),
  )
  return row ?? null
}

/** Newest first. */
export function listOf(
  tx: Tx,
  clubId: string,
  scope: { sessionId?: string | undefined; athleteId?: string | undefined },
): Promise<RecomputeRow[]> {
  return select(tx)
    .where(
      and(
        eq(recomputes.clubId, clubId),
        scope.sessionId ? eq(recomputes.sessionId, scope.sessionId) : undefined,
        scope.athleteId ? eq(recomputes.athleteId, scope.athleteId) : undefined,
      ),
    )
    .orderBy(desc(recomputes.createdAt))
    .limit(listed)
}

export async function insertRecompute(
  tx: Tx,
  row: typeof recomputes.$inferInsert,
  batches: readonly string[][],
): Promise<string> {
  const [{ id }] = await tx.insert(recomputes).values(row).returning({ id: recomputes.id })
  await tx
    .insert(recomputeBatches)
    .values(batches.map((trialIds, n) => ({ clubId: row.clubId, recomputeId: id, n, trialIds })))
  return id
}

/** Ends one that is open; whatever else it is stays as it is. */
export async function endRecompute(
  tx: Tx,
  clubId: string,
  id: string,
  end: { state: 'cancelled' | 'failed' | 'done'; finishedAt: Date },
): Promise<boolean> {
  const ended = await tx
    .update(recomputes)
    .set(end)
    .where(and(eq(recomputes.clubId, clubId), eq(recomputes.id, id), inArray(recomputes.state, openStates)))
    .returning({ id: recomputes.id })
  return ended.length > 0
}

/** A recompute that is wanted on, with one of its batches that is not done yet. */
export async function findBatch(tx: Tx, clubId: string, id: string, n: number) {
  const [row] = await tx
    .select({
      dryRun: recomputes.dryRun,
      engineVersion: recomputes.engineVersion,
      madeWith: recomputes.madeWith,
      trialIds: recomputeBatches.trialIds,
    })
    .from(recomputes)
    .innerJoin(
      recomputeBatches,
      and(
        eq(recomputeBatches.clubId, recomputes.clubId),
        eq(recomputeBatches.recomputeId, recomputes.id),
        eq(recomputeBatches.n, n),
        isNull(recomputeBatches.doneAt),
      ),
    )
    .where(and(eq(recomputes.clubId, clubId), eq(recomputes.id, id), inArray(recomputes.state, openStates)))
  return row ?? null
}

/** Says that somebody works on it. */
export async function markRunning(tx: Tx, clubId: string, id: string, startedAt: Date): Promise<void> {
  await tx
    .update(recomputes)
    .set({ state: 'running', startedAt })
    .where(and(eq(recomputes.clubId, clubId), eq(recomputes.id, id), eq(recomputes.state, 'waiting')))
}

/** Until the transaction ends nobody else does this batch; false where somebody has. */
export async function lockBatch(tx: Tx, clubId: string, id: string, n: number): Promise<boolean> {
  const [row] = await tx
    .select({ doneAt: recomputeBatches.doneAt })
    .from(recomputeBatches)
    .where(
      and(
        eq(recomputeBatches.clubId, clubId),
        eq(recomputeBatches.recomputeId, id),
        eq(recomputeBatches.n, n),
      ),
    )
    .for('update')
  return row?.doneAt === null
}

/** Notes a batch as done; true where the whole is, or has been ended. */
export async function completeBatch(
  tx: Tx,
  batch: { clubId: string; id: string; n: number; trials: number; doneAt: Date; moves: Moves },
): Promise<boolean> {
  const { clubId, id, n, trials: count, doneAt, moves } = batch
  await tx
    .update(recomputeBatches)
    .set({ doneAt, moves })
    .where(
      and(
        eq(recomputeBatches.clubId, clubId),
        eq(recomputeBatches.recomputeId, id),
        eq(recomputeBatches.n, n),
      ),
    )
  const [row] = await tx
    .update(recomputes)
    .set({ done: sql`${recomputes.done} + ${count}` })
    .where(and(eq(recomputes.clubId, clubId), eq(recomputes.id, id)))
    .returning({ done: recomputes.done, total: recomputes.total, state: recomputes.state })
  return row.done === row.total || !openStates.includes(row.state)
}

/** What moved so far; locks the row, so that two who add up do it one after the other. */
export async function lockMoves(tx: Tx, clubId: string, id: string) {
  const [row] = await tx
    .select({ moves: recomputes.moves, done: recomputes.done, total: recomputes.total })
    .from(recomputes)
    .where(and(eq(recomputes.clubId, clubId), eq(recomputes.id, id)))
    .for('update')
  return row ?? null
}

/** Takes the next batches whose moves are not added up yet. */
export async function takeMoves(tx: Tx, clubId: string, id: string, atMost: number): Promise<Moves[]> {
  const rows = await tx
    .select({ n: recomputeBatches.n, moves: recomputeBatches.moves })
    .from(recomputeBatches)
    .where(
      and(
        eq(recomputeBatches.clubId, clubId),
        eq(recomputeBatches.recomputeId, id),
        isNotNull(recomputeBatches.moves),
      ),
    )
    .orderBy(recomputeBatches.n)
    .limit(atMost)
  if (rows.length === 0) return []
  await tx
    .update(recomputeBatches)
    .set({ moves: null })
    .where(
      and(
        eq(recomputeBatches.clubId, clubId),
        eq(recomputeBatches.recomputeId, id),
        inArray(
          recomputeBatches.n,
          rows.map(({ n }) => n),
        ),
      ),
    )
  return rows.flatMap(({ moves }) => moves ?? [])
}

export async function storeMoves(tx: Tx, clubId: string, id: string, moves: Moves): Promise<void> {
  await tx
    .update(recomputes)
    .set({ moves })
    .where(and(eq(recomputes.clubId, clubId), eq(recomputes.id, id)))
}

export async function findMoves(tx: Tx, clubId: string, id: string): Promise<Moves | null> {
  const [row] = await tx
    .select({ moves: recomputes.moves })
    .from(recomputes)
    .where(and(eq(recomputes.clubId, clubId), eq(recomputes.id, id)))
  return row?.moves ?? null
}

export function namesOfSessions(tx: Tx, clubId: string, ids: string[]) {
  return tx
    .select({ id: sessions.id, title: sessions.title, date: sessions.date })
    .from(sessions)
    .where(and(eq(sessions.clubId, clubId), inArray(sessions.id, ids)))
    .orderBy(desc(sessions.date), sessions.title)
}

export function namesOfTrials(tx: Tx, clubId: string, ids: string[]) {
  return tx
    .select({
      id: trials.id,
      athleteName: athletes.name,
      sessionTitle: sessions.title,
      sessionDate: sessions.date,
    })
    .from(trials)
    .innerJoin(sessions, and(eq(sessions.clubId, trials.clubId), eq(sessions.id, trials.sessionId)))
    .leftJoin(athletes, and(eq(athletes.clubId, trials.clubId), eq(athletes.id, trials.athleteId)))
    .where(and(eq(trials.clubId, clubId), inArray(trials.id, ids)))
}

/** Whether the club has this session, or this athlete. */
export async function isThere(tx: Tx, clubId: string, scope: { sessionId?: string; athleteId?: string }) {
  const table = scope.sessionId ? sessions : athletes
  const [row] = await tx
    .select({ id: table.id })
    .from(table)
    .where(and(eq(table.clubId, clubId), eq(table.id, scope.sessionId ?? scope.athleteId ?? '')))
  return row !== undefined
}
