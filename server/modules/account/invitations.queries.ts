import { and, eq, gt, isNull, or, sql } from 'drizzle-orm'
import type { Role } from '../../../shared/contracts/roles.ts'
import type { Tx } from '../../db/database.ts'
import { clubs, invitations, memberships, people } from '../../db/schema/identity.ts'
import { athletes } from '../../db/schema/people-of-club.ts'

const open = (tokenHash: Buffer, now: Date) =>
  and(
    eq(invitations.tokenHash, tokenHash),
    isNull(invitations.acceptedAt),
    isNull(invitations.withdrawnAt),
    gt(invitations.expiresAt, now),
  )

/** The invitation behind a link, while it can be accepted, and the account its address has already. */
export async function findOpenInvitation(tx: Tx, tokenHash: Buffer, now: Date) {
  const [invitation] = await tx
    .select({
      clubName: clubs.name,
      name: invitations.name,
      email: invitations.email,
      roles: sql<Role[]>`${invitations.roles}`,
      personId: people.id,
      passwordHash: people.passwordHash,
    })
    .from(invitations)
    .innerJoin(clubs, eq(clubs.id, invitations.clubId))
    .leftJoin(people, eq(people.email, invitations.email))
    .where(open(tokenHash, now))
  return invitation ?? null
}

/** Uses the invitation up; of two at once only one gets it. */
export async function takeInvitation(tx: Tx, tokenHash: Buffer, now: Date) {
  const [taken] = await tx
    .update(invitations)
    .set({ acceptedAt: now, version: sql`${invitations.version} + 1` })
    .where(open(tokenHash, now))
    .returning({
      id: invitations.id,
      clubId: invitations.clubId,
      email: invitations.email,
      roles: sql<Role[]>`${invitations.roles}`,
      athleteId: invitations.athleteId,
    })
  return taken ?? null
}

/** The new person's id; null where the address has an account already. */
export async function insertPerson(
  tx: Tx,
  person: { email: string; name: string; passwordHash: string },
): Promise<string | null> {
  const [made] = await tx.insert(people).values(person).onConflictDoNothing().returning({ id: people.id })
  return made?.id ?? null
}

/** Makes the person a member; somebody who was one before is active again, with the new roles. */
export async function putMembership(
  tx: Tx,
  membership: { clubId: string; personId: string; roles: readonly Role[] },
): Promise<void> {
  const roles = [...membership.roles]
  await tx
    .insert(memberships)
    .values({ ...membership, roles })
    .onConflictDoUpdate({
      target: [memberships.clubId, memberships.personId],
      set: { roles, active: true, version: sql`${memberships.version} + 1` },
    })
}

/** Links the athlete record to the person; false where it is somebody else's already. */
export async function linkAthlete(
  tx: Tx,
  { clubId, athleteId, personId }: { clubId: string; athleteId: string; personId: string },
): Promise<boolean> {
  const linked = await tx
    .update(athletes)
    .set({ personId, version: sql`${athletes.version} + 1` })
    .where(
      and(
        eq(athletes.clubId, clubId),
        eq(athletes.id, athleteId),
        or(isNull(athletes.personId), eq(athletes.personId, personId)),
      ),
    )
    .returning({ id: athletes.id })
  return linked.length > 0
}
