import { and, asc, eq, inArray, sql } from 'drizzle-orm'
import { named } from '../../db/constraint-errors.ts'
import type { Tx } from '../../db/database.ts'
import { athletes, squadMembers, squads } from '../../db/schema/people-of-club.ts'
import { notFound } from '../../http/errors.ts'
import { nameTaken } from './squads.errors.ts'

const ofClub = (clubId: string, id: string) => and(eq(squads.clubId, clubId), eq(squads.id, id))

/** Squads with the athletes in them, by name; those in use first. */
export function selectSquads(tx: Tx, clubId: string) {
  return tx
    .select({
      id: squads.id,
      name: squads.name,
      athleteIds: sql<string[]>`array(
        select m.athlete_id from club.squad_members m
        join club.athletes a on a.club_id = m.club_id and a.id = m.athlete_id
        where m.club_id = squads.club_id and m.squad_id = squads.id order by a.name, a.id)`,
      archived: sql<boolean>`${squads.archivedAt} is not null`,
      version: squads.version,
    })
    .from(squads)
    .where(eq(squads.clubId, clubId))
    .orderBy(sql`${squads.archivedAt} is not null`, asc(squads.name), asc(squads.id))
    .$dynamic()
}

export async function findSquad(tx: Tx, clubId: string, id: string) {
  const [squad] = await selectSquads(tx, clubId).where(ofClub(clubId, id))
  return squad ?? null
}

export async function insertSquad(tx: Tx, clubId: string, name: string): Promise<string> {
  const insert = tx.insert(squads).values({ clubId, name }).returning({ id: squads.id })
  const [made] = await named({ squads_name: nameTaken }, insert)
  if (!made) throw new Error('the squad was not returned')
  return made.id
}

/** False where the version is not the row's (any more). */
export async function updateSquad(
  tx: Tx,
  clubId: string,
  id: string,
  version: number,
  change: { name?: string; archivedAt?: Date | null },
): Promise<boolean> {
  const update = tx
    .update(squads)
    .set({ ...change, version: version + 1 })
    .where(and(ofClub(clubId, id), eq(squads.version, version)))
    .returning({ id: squads.id })
  return (await named({ squads_name: nameTaken }, update)).length > 0
}

/**
 * Makes other changes of who is in which squad of the club wait until the transaction ends. Called first of all:
 * a squad's change goes on to athletes' rows and an athlete's to squads', so two at once would lock each other up.
 */
export async function lockSquadLists(tx: Tx, clubId: string): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`squads/${clubId}`}, 0))`)
}

export interface Membership {
  squadId: string
  athleteId: string
}

/** The two sides that a list of members can be replaced from. */
const sides = {
  squad: { own: squadMembers.squadId, other: squadMembers.athleteId },
  athlete: { own: squadMembers.athleteId, other: squadMembers.squadId },
}
export type Side = keyof typeof sides

/**
 * Makes `wanted` the whole list of one squad's athletes, or of one athlete's squads. Returns the ids that came
 * or went: their own rows show the change too.
 */
export async function replaceMembers(
  tx: Tx,
  clubId: string,
  side: Side,
  ownId: string,
  wanted: readonly string[],
): Promise<string[]> {
  const { own, other } = sides[side]
  const ofOwn = and(eq(squadMembers.clubId, clubId), eq(own, ownId))
  const rows = await tx.select({ id: other }).from(squadMembers).where(ofOwn)
  const present = new Set(rows.map(({ id }) => id))
  const gone = [...present].filter((id) => !wanted.includes(id))
  const come = [...new Set(wanted)].filter((id) => !present.has(id))
  if (gone.length > 0) await tx.delete(squadMembers).where(and(ofOwn, inArray(other, gone)))
  if (come.length > 0) await insertMembers(tx, clubId, side, ownId, come)
  return [...gone, ...come]
}

async function insertMembers(tx: Tx, clubId: string, side: Side, ownId: string, otherIds: string[]) {
  const lines = otherIds.map((otherId) => ({
    clubId,
    squadId: side === 'squad' ? ownId : otherId,
    athleteId: side === 'squad' ? otherId : ownId,
  }))
  await named(
    {
      squad_members_club_id_squad_id_squads_club_id_id_fk: () => notFound('One of the squads'),
      squad_members_club_id_athlete_id_athletes_club_id_id_fk: () => notFound('One of the athletes'),
    },
    tx.insert(squadMembers).values(lines).onConflictDoNothing(),
  )
}

/** Counts up the versions of the squads or athletes whose lists changed from the other side. */
export async function countUpVersions(tx: Tx, clubId: string, side: Side, ids: string[]): Promise<void> {
  if (ids.length === 0) return
  const table = side === 'squad' ? squads : athletes
  await tx
    .update(table)
    .set({ version: sql`${table.version} + 1` })
    .where(and(eq(table.clubId, clubId), inArray(table.id, ids)))
}
