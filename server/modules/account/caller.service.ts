import { capabilitiesOf } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { findMember } from './account.queries.ts'

/** Who calls, with the roles of this moment; null where the person is no active member of the club (any more). */
export async function findCaller(
  { db }: Pick<Deps, 'db'>,
  { clubId, personId }: { clubId: string; personId: string },
): Promise<Caller | null> {
  const member = await db.inClub({ clubId, personId, capabilities: [] }, (tx) =>
    findMember(tx, clubId, personId),
  )
  return member && { clubId, personId, ...member, capabilities: capabilitiesOf(member.roles) }
}
