import { randomUUID } from 'node:crypto'
import { foldName } from '../../shared/contracts/names.ts'
import { workerContext, type Database } from '../../server/db/database.ts'
import { athletes, squadMembers, squads } from '../../server/db/schema/people-of-club.ts'
import { seats } from '../../server/db/schema/seats.ts'

export interface AthleteRow {
  name?: string
  bornOn?: string | null
  recordedMassKg?: number | null
  personId?: string | null
  squadIds?: readonly string[]
}

/** A valid athlete record, with a seat; returns its id. Needs a database of the web role. */
export async function buildAthlete(
  db: Database,
  clubId: string,
  { squadIds = [], ...row }: AthleteRow = {},
): Promise<string> {
  const id = randomUUID()
  const name = row.name ?? `Athlete ${id.slice(0, 8)}`
  await db.inClub(workerContext(clubId), async (tx) => {
    await tx.insert(athletes).values({ clubId, id, ...row, name, nameKey: foldName(name) })
    const lines = squadIds.map((squadId) => ({ clubId, squadId, athleteId: id }))
    if (lines.length > 0) await tx.insert(squadMembers).values(lines)
    await tx.insert(seats).values({ clubId, athleteId: id, assignedAt: new Date(0) })
  })
  return id
}

/** A valid squad without athletes; returns its id. */
export async function buildSquad(
  db: Database,
  clubId: string,
  { name }: { name?: string } = {},
): Promise<string> {
  const id = randomUUID()
  const row = { clubId, id, name: name ?? `Squad ${id.slice(0, 8)}` }
  await db.inClub(workerContext(clubId), (tx) => tx.insert(squads).values(row))
  return id
}
