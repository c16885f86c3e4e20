import { and, asc, eq, sql } from 'drizzle-orm'
import type { Role } from '../../../shared/contracts/roles.ts'
import type { Tx } from '../../db/database.ts'
import { memberships, people } from '../../db/schema/identity.ts'
import { athletes } from '../../db/schema/people-of-club.ts'

/** Members of the club, by name. */
export function selectMembers(tx: Tx, clubId: string) {
  return tx
    .select({
      id: people.id,
      name: people.name,
      email: people.email,
      roles: sql<Role[]>`${memberships.roles}`,
      active: memberships.active,
      version: memberships.version,
      athleteId: athletes.id,
    })
    .from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .leftJoin(
      athletes,
      and(eq(athletes.clubId, memberships.clubId), eq(athletes.personId, memberships.personId)),
    )
    .where(eq(memberships.clubId, clubId))
    .orderBy(asc(people.name), asc(people.id))
    .$dynamic()
}

export async function findMember(tx: Tx, clubId: string, personId: string) {
  const [member] = await selectMembers(tx, clubId).where(
    and(eq(memberships.clubId, clubId), eq(memberships.personId, personId)),
  )
  return member ?? null
}

export async function hasActiveMember(tx: Tx, clubId: string, email: string): Promise<boolean> {
  const found = await tx
    .select({ id: people.id })
    .from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .where(and(eq(memberships.clubId, clubId), eq(people.email, email), memberships.active))
  return found.length > 0
}

/** Active admins, locked until the transaction ends: two admins cannot remove each other at once. */
export async function lockActiveAdmins(tx: Tx, clubId: string): Promise<string[]> {
  const admins = await tx
    .select({ personId: memberships.personId })
    .from(memberships)
    .where(and(eq(memberships.clubId, clubId), memberships.active, sql`'admin' = any(${memberships.roles})`))
    .orderBy(asc(memberships.personId))
    .for('update')
  return admins.map(({ personId }) => personId)
}

/** False where the version is not the row's (any more). */
export async function updateMembership(
  tx: Tx,
  clubId: string,
  personId: string,
  { version, ...change }: { version: number; roles?: Role[]; active?: boolean },
): Promise<boolean> {
  const changed = await tx
    .update(memberships)
    .set({ ...change, version: version + 1 })
    .where(
      and(
        eq(memberships.clubId, clubId),
        eq(memberships.personId, personId),
        eq(memberships.version, version),
      ),
    )
    .returning({ version: memberships.version })
  return changed.length > 0
}
