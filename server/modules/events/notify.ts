import { sql } from 'drizzle-orm'
import type { ClubEvent } from '../../../shared/contracts/events.ts'
import type { Tx } from '../../db/database.ts'

/** PostgreSQL's channel for what changed in any club. */
export const eventChannel = 'club_events'

/** Who is told: the staff, or the club's athletes as well (what they may read has changed). */
export type Audience = 'staff' | 'everybody'

export interface Notice extends ClubEvent {
  clubId: string
  audience: Audience
}

/** Tells open screens, once the transaction is there, that they show something old. Ids only. */
export async function notify(
  tx: Tx,
  clubId: string,
  event: ClubEvent,
  audience: Audience = 'staff',
): Promise<void> {
  const notice: Notice = { clubId, audience, ...event }
  await tx.execute(sql`select pg_notify(${eventChannel}, ${JSON.stringify(notice)})`)
}
