import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { noActiveMembership } from './account.errors.ts'
import { findFirstClub, findPersonByEmail } from './account.queries.ts'
import { findCaller } from './caller.service.ts'
import { passwordFits } from './passwords.ts'

/** The member that an address and password belong to; null where they do not fit, whatever the reason. */
export async function checkCredentials(
  deps: Pick<Deps, 'db'>,
  { email, password }: { email: string; password: string },
): Promise<Caller | null> {
  const person = await deps.db.inIdentity((tx) => findPersonByEmail(tx, email))
  const fits = await passwordFits(person?.passwordHash ?? null, password)
  if (!person || !fits) return null
  const clubId = await deps.db.inIdentity((tx) => findFirstClub(tx, person.id))
  const caller = clubId && (await findCaller(deps, { clubId, personId: person.id }))
  if (!caller) throw noActiveMembership()
  return caller
}
