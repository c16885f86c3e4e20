import { and, count, eq, isNull, sql } from 'drizzle-orm'
import { staffRoles } from '../../../shared/contracts/roles.ts'
import type { ClubSettings } from '../../../shared/contracts/clubs.ts'
import type { Tx } from '../../db/database.ts'
import { clubs, memberships } from '../../db/schema/identity.ts'
import { athletes, settings } from '../../db/schema/people-of-club.ts'

const settingsColumns = {
  landingPeakLimits: sql<ClubSettings['landingPeakLimits']>`${settings.landingPeakLimits}`,
  version: settings.version,
}

export async function findSettings(tx: Tx, clubId: string): Promise<ClubSettings | null> {
  const [found] = await tx.select(settingsColumns).from(settings).where(eq(settings.clubId, clubId))
  return found ?? null
}

/** Null where the version is not the row's (any more). */
export async function updateSettings(
  tx: Tx,
  clubId: string,
  { version, landingPeakLimits }: ClubSettings,
): Promise<ClubSettings | null> {
  const [changed] = await tx
    .update(settings)
    .set({ landingPeakLimits: { ...landingPeakLimits }, version: version + 1 })
    .where(and(eq(settings.clubId, clubId), eq(settings.version, version)))
    .returning(settingsColumns)
  return changed ?? null
}

export async function countSeats(tx: Tx, clubId: string) {
  const [active] = await tx
    .select({ used: count() })
    .from(athletes)
    .where(and(eq(athletes.clubId, clubId), isNull(athletes.archivedAt)))
  const [club] = await tx.select({ paid: settings.seats }).from(settings).where(eq(settings.clubId, clubId))
  const [members] = await tx
    .select({ staff: count() })
    .from(memberships)
    .where(
      and(
        eq(memberships.clubId, clubId),
        memberships.active,
        sql`${memberships.roles} && ${sql.param([...staffRoles])}::text[]`,
      ),
    )
  return { used: active?.used ?? 0, paid: club?.paid ?? 0, staff: members?.staff ?? 0 }
}

export async function insertClub(tx: Tx, club: { name: string; timeZone: string }): Promise<string> {
  const [made] = await tx.insert(clubs).values(club).returning({ id: clubs.id })
  if (!made) throw new Error('the club was not returned')
  return made.id
}

export async function insertSettings(tx: Tx, row: { clubId: string; seats: number; demo: boolean }) {
  await tx.insert(settings).values(row)
}
