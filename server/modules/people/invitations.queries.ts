import { and, asc, eq, isNull, sql } from 'drizzle-orm'
import type { Role } from '../../../shared/contracts/roles.ts'
import { named } from '../../db/constraint-errors.ts'
import type { Tx } from '../../db/database.ts'
import { invitations } from '../../db/schema/identity.ts'
import { athletes } from '../../db/schema/people-of-club.ts'
import { alreadyInvited } from './people.errors.ts'

const columns = {
  id: invitations.id,
  name: invitations.name,
  email: invitations.email,
  roles: sql<Role[]>`${invitations.roles}`,
  athleteId: invitations.athleteId,
  expiresAt: invitations.expiresAt,
  version: invitations.version,
}
const isOpen = and(isNull(invitations.acceptedAt), isNull(invitations.withdrawnAt))
const ofClub = (clubId: string, id: string) => and(eq(invitations.clubId, clubId), eq(invitations.id, id))

export function selectOpenInvitations(tx: Tx, clubId: string) {
  return tx
    .select(columns)
    .from(invitations)
    .where(and(eq(invitations.clubId, clubId), isOpen))
    .orderBy(asc(invitations.createdAt), asc(invitations.id))
}

export async function findInvitation(tx: Tx, clubId: string, id: string) {
  const [invitation] = await tx
    .select(columns)
    .from(invitations)
    .where(and(ofClub(clubId, id), isOpen))
  return invitation ?? null
}

export interface NewInvitation {
  clubId: string
  email: string
  name: string
  roles: Role[]
  athleteId: string | null
  expiresAt: Date
  invitedBy: string | null
  tokenHash: Buffer
}

export async function insertInvitation(tx: Tx, invitation: NewInvitation) {
  const insert = tx.insert(invitations).values(invitation).returning(columns)
  const [made] = await named({ invitations_open: alreadyInvited }, insert)
  if (!made) throw new Error('the invitation was not returned')
  return made
}

/** The changed row; null where the version is not the row's, or the invitation is not open (any more). */
export async function updateInvitation(
  tx: Tx,
  clubId: string,
  id: string,
  version: number,
  change: { expiresAt?: Date; withdrawnAt?: Date },
) {
  const [changed] = await tx
    .update(invitations)
    .set({ ...change, version: version + 1 })
    .where(and(ofClub(clubId, id), isOpen, eq(invitations.version, version)))
    .returning(columns)
  return changed ?? null
}

/** Gives an open invitation the secret of its newest link; false where it is not open (any more). */
export async function setToken(tx: Tx, id: string, tokenHash: Buffer): Promise<boolean> {
  const set = await tx
    .update(invitations)
    .set({ tokenHash })
    .where(and(eq(invitations.id, id), isOpen))
    .returning({ id: invitations.id })
  return set.length > 0
}

/** Whether an athlete record can still be given to somebody; null where the club has no such athlete. */
export async function findAthleteLink(tx: Tx, clubId: string, athleteId: string) {
  const [athlete] = await tx
    .select({ personId: athletes.personId })
    .from(athletes)
    .where(and(eq(athletes.clubId, clubId), eq(athletes.id, athleteId), isNull(athletes.archivedAt)))
  return athlete ?? null
}
