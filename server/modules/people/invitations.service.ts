import type { BodyOf } from '../../../shared/contracts/endpoint.ts'
import { limits } from '../../../shared/contracts/limits.ts'
import type { Invitation, invitePerson } from '../../../shared/contracts/people.ts'
import type { Role } from '../../../shared/contracts/roles.ts'
import type { Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { invalidRequest, notFound, staleVersion } from '../../http/errors.ts'
import { countTry } from '../../http/rate-limits.ts'
import { newToken } from '../account/tokens.ts'
import { record } from '../audit/audit.service.ts'
import { sendMail } from '../mail/mail.service.ts'
import { takeSeatByItself } from '../seats/seats.service.ts'
import {
  findAthleteLink,
  findInvitation,
  insertInvitation,
  selectOpenInvitations,
  setToken,
  updateInvitation,
} from './invitations.queries.ts'
import { alreadyMember, athleteAlreadyLinked } from './people.errors.ts'
import { hasActiveMember } from './people.queries.ts'

type InviteDeps = Pick<Deps, 'db' | 'clock'>
type InvitationRow = Awaited<ReturnType<typeof insertInvitation>>

const expiryFrom = (now: Date) => new Date(now.getTime() + limits.invitationDays * 24 * 3600 * 1000)

const describe = (row: InvitationRow, now: Date): Invitation => ({
  ...row,
  expiresAt: row.expiresAt.toISOString(),
  expired: row.expiresAt <= now,
})

export async function listOpenInvitations(tx: Tx, ctx: Caller, now: Date): Promise<Invitation[]> {
  return (await selectOpenInvitations(tx, ctx.clubId)).map((row) => describe(row, now))
}

/** Invites somebody to the club; the mail with the link goes out with it. No address is sent more than five an hour. */
export async function invite(
  { db, clock }: InviteDeps,
  ctx: Caller,
  form: BodyOf<typeof invitePerson>,
): Promise<Invitation> {
  if (form.athleteId && !form.roles.includes('athlete')) {
    throw invalidRequest('Only somebody with the role athlete can be one of the club’s athletes.', {
      athleteId: 'Choose the role athlete too, or no athlete',
    })
  }
  await countTry(db.pool, 'invitation-address', form.email)
  return db.inClub(ctx, async (tx) => {
    if (form.athleteId) await requireFreeAthlete(tx, ctx.clubId, form.athleteId)
    if (await hasActiveMember(tx, ctx.clubId, form.email)) throw alreadyMember()
    const row = await insertInvitation(tx, {
      ...form,
      clubId: ctx.clubId,
      invitedBy: ctx.personId,
      expiresAt: expiryFrom(clock()),
      // Opened by nobody: the secret of the link is made when it is mailed.
      tokenHash: newToken().tokenHash,
    })
    await record(tx, ctx, 'invitation.send', 'invitation', row.id, { roles: row.roles })
    if (form.athleteId) await takeSeatByItself(tx, ctx.clubId, form.athleteId, clock())
    await mailInvitation(tx, ctx.clubId, row)
    return describe(row, clock())
  })
}

/** Sends the mail again with a new link; the one before stops working. */
export async function resend({ db, clock }: InviteDeps, ctx: Caller, id: string, version: number) {
  const present = await db.inClub(ctx, (tx) => findInvitation(tx, ctx.clubId, id))
  if (!present) throw notFound('This invitation')
  await countTry(db.pool, 'invitation-address', present.email)
  return db.inClub(ctx, async (tx) => {
    const row = await change(tx, ctx, id, version, { expiresAt: expiryFrom(clock()) }, clock())
    await record(tx, ctx, 'invitation.resend', 'invitation', id)
    await mailInvitation(tx, ctx.clubId, row)
    return describe(row, clock())
  })
}

export async function withdraw({ db, clock }: InviteDeps, ctx: Caller, id: string, version: number) {
  return db.inClub(ctx, async (tx) => {
    await change(tx, ctx, id, version, { withdrawnAt: clock() }, clock())
    await record(tx, ctx, 'invitation.withdraw', 'invitation', id)
    return null
  })
}

/** An invitation that nobody of the club sends: of its first admin. Returns the secret of its link. */
export async function prepareInvitation(
  tx: Tx,
  clubId: string,
  person: { name: string; email: string; roles: Role[] },
  now: Date,
): Promise<string> {
  const { token, tokenHash } = newToken()
  const expiresAt = expiryFrom(now)
  await insertInvitation(tx, { ...person, clubId, athleteId: null, invitedBy: null, expiresAt, tokenHash })
  return token
}

/** Makes the secret of an invitation's link just before it is mailed; null where it is not open any more. */
export async function openInvitationLink(tx: Tx, invitationId: string): Promise<string | null> {
  const { token, tokenHash } = newToken()
  return (await setToken(tx, invitationId, tokenHash)) ? token : null
}

async function change(
  tx: Tx,
  ctx: Caller,
  id: string,
  version: number,
  values: { expiresAt?: Date; withdrawnAt?: Date },
  now: Date,
): Promise<InvitationRow> {
  const row = await updateInvitation(tx, ctx.clubId, id, version, values)
  if (row) return row
  const present = await findInvitation(tx, ctx.clubId, id)
  throw present ? staleVersion(describe(present, now)) : notFound('This invitation')
}

async function requireFreeAthlete(tx: Tx, clubId: string, athleteId: string): Promise<void> {
  const athlete = await findAthleteLink(tx, clubId, athleteId)
  if (!athlete) throw notFound('This athlete')
  if (athlete.personId) throw athleteAlreadyLinked()
}

const mailInvitation = (tx: Tx, clubId: string, { id, email }: InvitationRow) =>
  sendMail(tx, { clubId, to: email, template: 'invitation', payload: { invitationId: id } })
