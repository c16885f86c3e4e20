import { and, asc, eq, ne, sql } from 'drizzle-orm'
import type { Role } from '../../../shared/contracts/roles.ts'
import type { Tx } from '../../db/database.ts'
import { standings } from '../../db/schema/billing.ts'
import { clubs, memberships, people, signInSessions } from '../../db/schema/identity.ts'
import { athletes, settings } from '../../db/schema/people-of-club.ts'

export async function findPersonByEmail(tx: Tx, email: string) {
  const [person] = await tx
    .select({ id: people.id, passwordHash: people.passwordHash })
    .from(people)
    .where(eq(people.email, email))
  return person ?? null
}

export async function findPasswordHash(tx: Tx, personId: string): Promise<string | null> {
  const [person] = await tx
    .select({ passwordHash: people.passwordHash })
    .from(people)
    .where(eq(people.id, personId))
  return person?.passwordHash ?? null
}

/** The club that a person signs in to: the first they joined and are active in. */
export async function findFirstClub(tx: Tx, personId: string): Promise<string | null> {
  const [membership] = await tx
    .select({ clubId: memberships.clubId })
    .from(memberships)
    .where(and(eq(memberships.personId, personId), memberships.active))
    .orderBy(asc(memberships.createdAt))
    .limit(1)
  return membership?.clubId ?? null
}

/** Roles of an active member, their athlete record, and until when the club writes; null where there is no such member. */
export async function findMember(tx: Tx, clubId: string, personId: string) {
  const [member] = await tx
    .select({
      roles: sql<Role[]>`${memberships.roles}`,
      athleteId: athletes.id,
      readsOnlyFrom: standings.readsOnlyFrom,
    })
    .from(memberships)
    .leftJoin(
      athletes,
      and(eq(athletes.clubId, memberships.clubId), eq(athletes.personId, memberships.personId)),
    )
    .leftJoin(standings, eq(standings.clubId, memberships.clubId))
    .where(and(eq(memberships.clubId, clubId), eq(memberships.personId, personId), memberships.active))
  return member ?? null
}

export async function readMe(tx: Tx, clubId: string, personId: string) {
  const [row] = await tx
    .select({
      person: { id: people.id, name: people.name, email: people.email },
      club: { id: clubs.id, name: clubs.name, timeZone: clubs.timeZone, demo: settings.demo },
    })
    .from(clubs)
    .innerJoin(settings, eq(settings.clubId, clubs.id))
    .innerJoin(people, eq(people.id, personId))
    .where(eq(clubs.id, clubId))
  return row ?? null
}

export async function setPassword(tx: Tx, personId: string, passwordHash: string): Promise<void> {
  await tx
    .update(people)
    .set({ passwordHash, version: sql`${people.version} + 1` })
    .where(eq(people.id, personId))
}

/** Ends the person's sign-ins everywhere, but for the one to keep. */
export async function endSignIns(tx: Tx, personId: string, keepSid = ''): Promise<void> {
  const person = sql`(${signInSessions.sess} -> 'passport' -> 'user' ->> 'personId')`
  await tx.delete(signInSessions).where(and(sql`${person} = ${personId}`, ne(signInSessions.sid, keepSid)))
}
