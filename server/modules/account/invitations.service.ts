import type { z } from 'zod'
import type { acceptInvitation, InvitationView } from '../../../shared/contracts/account.ts'
import type { BodyOf } from '../../../shared/contracts/endpoint.ts'
import { named } from '../../db/constraint-errors.ts'
import { capabilitiesOf, enterClub, type ClubContext, type Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { countTry } from '../../http/rate-limits.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import { athleteAlreadyLinked } from '../people/people.errors.ts'
import { emailTaken, tokenInvalid, wrongPassword } from './account.errors.ts'
import { findCaller } from './caller.service.ts'
import {
  findOpenInvitation,
  insertPerson,
  linkAthlete,
  putMembership,
  takeInvitation,
} from './invitations.queries.ts'
import { hashPassword, passwordFits } from './passwords.ts'
import { hashToken } from './tokens.ts'

type InvitationDeps = Pick<Deps, 'db' | 'clock'>

/** What an invitation's link shows before it is accepted. */
export async function readInvitation(
  deps: InvitationDeps,
  token: string,
  network: string,
): Promise<z.output<typeof InvitationView>> {
  const { clubName, name, email, roles, passwordHash } = await openInvitation(deps, token, network)
  return { clubName, name, email, roles, hasAccount: passwordHash !== null }
}

/**
 * Makes the account, or checks the password of the one that the address has; then, in one transaction, uses the
 * invitation up, makes the membership and links the athlete record.
 */
export async function acceptByToken(
  deps: InvitationDeps,
  token: string,
  form: BodyOf<typeof acceptInvitation>,
  network: string,
): Promise<Caller> {
  const { db, clock } = deps
  const invitation = await openInvitation(deps, token, network)
  const hasAccount = invitation.passwordHash !== null
  if (hasAccount && !(await passwordFits(invitation.passwordHash, form.password))) throw wrongPassword()
  const passwordHash = hasAccount ? null : await hashPassword(form.password)
  const member = await db.inIdentity(async (tx) => {
    const taken = await takeInvitation(tx, hashToken(token), clock())
    if (!taken) throw tokenInvalid()
    const personId = passwordHash
      ? await insertPerson(tx, { email: taken.email, name: form.name, passwordHash })
      : invitation.personId
    if (!personId) throw emailTaken()
    await putMembership(tx, { clubId: taken.clubId, personId, roles: taken.roles })
    // The accepted invitation is the club's word: it may link the record that it names.
    const ctx: ClubContext = { clubId: taken.clubId, personId, capabilities: ['staff'] }
    await enterClub(tx, ctx)
    await settleInClub(tx, ctx, { ...taken, personId })
    return { clubId: taken.clubId, personId, roles: taken.roles }
  })
  const caller = await findCaller(deps, member)
  return caller ?? { ...member, athleteId: null, capabilities: capabilitiesOf(member.roles) }
}

async function settleInClub(
  tx: Tx,
  ctx: ClubContext,
  { id, athleteId, personId }: { id: string; athleteId: string | null; personId: string },
): Promise<void> {
  if (athleteId) {
    const linked = await named(
      { athletes_person: athleteAlreadyLinked },
      linkAthlete(tx, { clubId: ctx.clubId, athleteId, personId }),
    )
    if (!linked) throw athleteAlreadyLinked()
    await notify(tx, ctx.clubId, { kind: 'athletes', id: athleteId })
  }
  await record(tx, ctx, 'invitation.accept', 'invitation', id)
}

async function openInvitation({ db, clock }: InvitationDeps, token: string, network: string) {
  await countTry(db.pool, 'link-network', network)
  const invitation = await db.inIdentity((tx) => findOpenInvitation(tx, hashToken(token), clock()))
  if (!invitation) throw tokenInvalid()
  return invitation
}
