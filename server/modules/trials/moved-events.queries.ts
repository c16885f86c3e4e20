import { and, desc, eq, isNull, sql } from 'drizzle-orm'
import type { EventMove } from '../../../shared/contracts/moved-events.ts'
import type { Tx } from '../../db/database.ts'
import { people } from '../../db/schema/identity.ts'
import { eventMoves } from '../../db/schema/trials.ts'

/** Every time that a trial's events were moved or put back, newest first. */
export async function findEventMoves(tx: Tx, clubId: string, trialId: string): Promise<EventMove[]> {
  const rows = await tx
    .select({
      events: eventMoves.events,
      stood: eventMoves.stood,
      reason: eventMoves.reason,
      byName: people.name,
      at: eventMoves.movedAt,
    })
    .from(eventMoves)
    .leftJoin(people, eq(people.id, eventMoves.movedBy))
    .where(and(eq(eventMoves.clubId, clubId), eq(eventMoves.trialId, trialId)))
    .orderBy(desc(eventMoves.movedAt), desc(eventMoves.id))
  return rows.map((row) => ({ ...row, byName: row.byName ?? '', at: row.at.toISOString() }))
}

export type NewEventMove = Omit<typeof eventMoves.$inferInsert, 'id' | 'movedAt' | 'supersededAt'>

/** Writes a move and supersedes the trial's earlier one. */
export async function insertEventMove(tx: Tx, move: NewEventMove): Promise<void> {
  await tx
    .update(eventMoves)
    .set({ supersededAt: sql`now()` })
    .where(
      and(
        eq(eventMoves.clubId, move.clubId),
        eq(eventMoves.trialId, move.trialId),
        isNull(eventMoves.supersededAt),
      ),
    )
  await tx.insert(eventMoves).values({ ...move, movedAt: sql`now()` })
}
