import { and, asc, count, desc, eq, sql, type SQL } from 'drizzle-orm'
import type { SessionSummary } from '../../../shared/contracts/sessions.ts'
import type { Test } from '../../../shared/contracts/tests.ts'
import type { Tx } from '../../db/database.ts'
import { sessions } from '../../db/schema/sessions.ts'

const ofSession = (clubId: string, sessionId: string) =>
  and(eq(sessions.clubId, clubId), eq(sessions.id, sessionId))

/** Inside a subquery Drizzle leaves the outer table's name off its columns, so these are written out. */
const countTrials = (condition = 'true') =>
  sql<number>`(select count(*)::int from club.trials t
    where t.club_id = sessions.club_id and t.session_id = sessions.id and ${sql.raw(condition)})`

const squadsOfSession = sql`club.session_squads ss
  join club.squads s on s.club_id = ss.club_id and s.id = ss.squad_id
  where ss.club_id = sessions.club_id and ss.session_id = sessions.id`

const testColumns = {
  protocol: sql<Test['protocol']>`${sessions.protocol}`,
  side: sql<Test['side']>`${sessions.side}`,
  externalLoadKg: sessions.externalLoadKg,
  boxHeightM: sessions.boxHeightM,
  arms: sql<Test['arms']>`${sessions.arms}`,
}

const summary = {
  id: sessions.id,
  date: sessions.date,
  title: sessions.title,
  place: sessions.place,
  test: testColumns,
  squadNames: sql<string[]>`array(select s.name from ${squadsOfSession} order by s.name)`,
  athletes: sql<number>`(select count(*)::int from club.session_athletes a
    where a.club_id = sessions.club_id and a.session_id = sessions.id)`,
  trials: countTrials(),
  inTray: countTrials('t.athlete_id is null and t.set_aside_at is null'),
  publishedAt: sessions.publishedAt,
  version: sessions.version,
}

const asSummary = (
  row: Omit<SessionSummary, 'publishedAt'> & { publishedAt: Date | null },
): SessionSummary => ({
  ...row,
  publishedAt: row.publishedAt?.toISOString() ?? null,
})

export async function findSummary(tx: Tx, clubId: string, sessionId: string): Promise<SessionSummary | null> {
  const [row] = await tx.select(summary).from(sessions).where(ofSession(clubId, sessionId))
  return row ? asSummary(row) : null
}

export interface SessionFilter {
  clubId: string
  search?: string
  squadId?: string
}

/** Sessions whose title, place, date or squads hold the searched words, newest first. */
function filtered({ clubId, search, squadId }: SessionFilter): SQL | undefined {
  const ofSquads = (condition: SQL) => sql`exists (select 1 from ${squadsOfSession} and ${condition})`
  const words = search?.trim().split(/\s+/u).filter(Boolean) ?? []
  const holds = (word: string) => {
    const pattern = `%${word.replace(/[\\%_]/gu, '\\$&')}%`
    return sql`(${sessions.title} ilike ${pattern} or ${sessions.place} ilike ${pattern}
      or ${sessions.date}::text like ${pattern} or ${ofSquads(sql`s.name ilike ${pattern}`)})`
  }
  return and(
    eq(sessions.clubId, clubId),
    squadId ? ofSquads(sql`s.id = ${squadId}`) : undefined,
    ...words.map(holds),
  )
}

export async function findSummaries(
  tx: Tx,
  filter: SessionFilter,
  page: { offset: number; limit: number },
): Promise<SessionSummary[]> {
  const rows = await tx
    .select(summary)
    .from(sessions)
    .where(filtered(filter))
    .orderBy(desc(sessions.date), desc(sessions.createdAt), asc(sessions.id))
    .limit(page.limit)
    .offset(page.offset)
  return rows.map(asSummary)
}

export async function countSessions(tx: Tx, filter: SessionFilter): Promise<number> {
  const [{ n }] = await tx.select({ n: count() }).from(sessions).where(filtered(filter))
  return n
}

export type SessionRow = typeof sessions.$inferSelect

export async function findSession(tx: Tx, clubId: string, sessionId: string): Promise<SessionRow | null> {
  const [row] = await tx.select().from(sessions).where(ofSession(clubId, sessionId))
  return row ?? null
}

export type NewSession = Pick<
  typeof sessions.$inferInsert,
  'clubId' | 'date' | 'title' | 'place' | 'note' | 'createdBy'
> & { test: Test }

export async function insertSession(tx: Tx, { test, ...session }: NewSession): Promise<string> {
  const [{ id }] = await tx
    .insert(sessions)
    .values({ ...session, ...test })
    .returning({ id: sessions.id })
  return id
}

/** Changes the session if it still is of that version; false if not. */
export async function updateSession(
  tx: Tx,
  { clubId, sessionId, version }: { clubId: string; sessionId: string; version: number },
  {
    test,
    ...change
  }: Partial<Pick<SessionRow, 'date' | 'title' | 'place' | 'note' | 'publishedAt'>> & { test?: Test },
): Promise<boolean> {
  const changed = await tx
    .update(sessions)
    .set({ ...change, ...test, version: sql`${sessions.version} + 1` })
    .where(and(ofSession(clubId, sessionId), eq(sessions.version, version)))
    .returning({ id: sessions.id })
  return changed.length > 0
}
