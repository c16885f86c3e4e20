import { randomUUID } from 'node:crypto'
import type { Role } from '../../shared/contracts/roles.ts'
import type { Database } from '../../server/db/database.ts'
import { memberships, people } from '../../server/db/schema/identity.ts'
import { hashPassword } from '../../server/modules/account/passwords.ts'

/** The password of every built person. */
export const builtPassword = 'tape measure chalk'
let passwordHash: Promise<string> | undefined

export interface BuiltPerson {
  id: string
  email: string
  name: string
}

/** A person with an account, in no club yet. */
export async function buildPerson(
  db: Database,
  person: { email?: string; name?: string } = {},
): Promise<BuiltPerson> {
  passwordHash ??= hashPassword(builtPassword)
  const id = randomUUID()
  const row = {
    id,
    email: person.email ?? `${id}@example.org`,
    name: person.name ?? `Person ${id.slice(0, 8)}`,
  }
  const withPassword = { ...row, passwordHash: await passwordHash }
  await db.inIdentity((tx) => tx.insert(people).values(withPassword))
  return row
}

/** A person who is a member of the club. */
export async function buildMember(
  db: Database,
  clubId: string,
  roles: readonly Role[],
  person: { email?: string; name?: string; active?: boolean } = {},
): Promise<BuiltPerson> {
  const built = await buildPerson(db, person)
  await buildMembership(db, clubId, built.id, roles, person.active)
  return built
}

export async function buildMembership(
  db: Database,
  clubId: string,
  personId: string,
  roles: readonly Role[],
  active = true,
): Promise<void> {
  await db.inIdentity((tx) => tx.insert(memberships).values({ clubId, personId, roles: [...roles], active }))
}
