import { randomUUID } from 'node:crypto'
import { workerContext, type Database } from '../../server/db/database.ts'
import { sessionAthletes, sessions, sessionSquads } from '../../server/db/schema/sessions.ts'

export interface SessionRow {
  createdBy: string
  date?: string
  title?: string
  publishedAt?: Date | null
  squadIds?: readonly string[]
  athleteIds?: readonly string[]
}

/** A valid session with its squads and athletes; returns its id. Needs a database of the web role. */
export async function buildSession(
  db: Database,
  clubId: string,
  { squadIds = [], athleteIds = [], ...row }: SessionRow,
): Promise<string> {
  const id = randomUUID()
  await db.inClub(workerContext(clubId), async (tx) => {
    await tx
      .insert(sessions)
      .values({ clubId, id, date: '2027-02-01', title: 'Monday tests', protocol: 'cmj', ...row })
    if (squadIds.length > 0) {
      await tx.insert(sessionSquads).values(squadIds.map((squadId) => ({ clubId, sessionId: id, squadId })))
    }
    if (athleteIds.length > 0) {
      const lines = athleteIds.map((athleteId) => ({ clubId, sessionId: id, athleteId }))
      await tx.insert(sessionAthletes).values(lines)
    }
  })
  return id
}
