import { and, asc, eq, sql } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import { athletes } from '../../db/schema/people-of-club.ts'

const ofClub = (clubId: string, id: string) => and(eq(athletes.clubId, clubId), eq(athletes.id, id))

/** Athletes with the squads they are in, by name; archived ones last. */
export function selectAthletes(tx: Tx, clubId: string) {
  return tx
    .select({
      id: athletes.id,
      name: athletes.name,
      bornOn: athletes.bornOn,
      recordedMassKg: athletes.recordedMassKg,
      squadIds: sql<string[]>`array(
        select m.squad_id from club.squad_members m
        where m.club_id = athletes.club_id and m.athlete_id = athletes.id order by m.squad_id)`,
      linked: sql<boolean>`${athletes.personId} is not null`,
      archived: sql<boolean>`${athletes.archivedAt} is not null`,
      version: athletes.version,
    })
    .from(athletes)
    .where(eq(athletes.clubId, clubId))
    .orderBy(sql`${athletes.archivedAt} is not null`, asc(athletes.name), asc(athletes.id))
    .$dynamic()
}

export async function findAthlete(tx: Tx, clubId: string, id: string) {
  const [athlete] = await selectAthletes(tx, clubId).where(ofClub(clubId, id))
  return athlete ?? null
}

export interface AthleteFields {
  name: string
  nameKey: string
  bornOn: string | null
  recordedMassKg: number | null
}

export async function insertAthlete(tx: Tx, clubId: string, fields: AthleteFields): Promise<string> {
  const [made] = await tx
    .insert(athletes)
    .values({ clubId, ...fields })
    .returning({ id: athletes.id })
  if (!made) throw new Error('the athlete was not returned')
  return made.id
}

/** False where the version is not the row's (any more). */
export async function updateAthlete(
  tx: Tx,
  clubId: string,
  id: string,
  version: number,
  change: Partial<AthleteFields> & { archivedAt?: Date | null },
): Promise<boolean> {
  const changed = await tx
    .update(athletes)
    .set({ ...change, version: version + 1 })
    .where(and(ofClub(clubId, id), eq(athletes.version, version)))
    .returning({ id: athletes.id })
  return changed.length > 0
}
