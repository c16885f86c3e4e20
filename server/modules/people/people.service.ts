import type { Person, changePerson } from '../../../shared/contracts/people.ts'
import type { BodyOf } from '../../../shared/contracts/endpoint.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { notFound, staleVersion } from '../../http/errors.ts'
import { record } from '../audit/audit.service.ts'
import { listOpenInvitations } from './invitations.service.ts'
import { lastAdmin } from './people.errors.ts'
import { findMember, lockActiveAdmins, selectMembers, updateMembership } from './people.queries.ts'

/** Members and open invitations of the club. */
export async function listClubPeople({ db, clock }: Pick<Deps, 'db' | 'clock'>, ctx: Caller) {
  return db.inClub(ctx, async (tx) => ({
    people: await selectMembers(tx, ctx.clubId),
    invitations: await listOpenInvitations(tx, ctx, clock()),
  }))
}

/** Changes roles, or closes and opens a membership; the club always keeps one active admin. */
export async function changeMember(
  { db }: Pick<Deps, 'db'>,
  ctx: Caller,
  personId: string,
  change: BodyOf<typeof changePerson>,
): Promise<Person> {
  return db.inClub(ctx, async (tx) => {
    const admins = await lockActiveAdmins(tx, ctx.clubId)
    const present = await findMember(tx, ctx.clubId, personId)
    if (!present) throw notFound('This person')
    if (present.version !== change.version) throw staleVersion(present)
    const next = { ...present, ...change }
    const staysAdmin = next.active && next.roles.includes('admin')
    if (admins.length === 1 && admins[0] === personId && !staysAdmin) throw lastAdmin()
    if (!(await updateMembership(tx, ctx.clubId, personId, change))) {
      throw staleVersion(await findMember(tx, ctx.clubId, personId))
    }
    const { version: _, ...detail } = change
    await record(tx, ctx, 'person.change', 'person', personId, detail)
    return { ...next, version: change.version + 1 }
  })
}
