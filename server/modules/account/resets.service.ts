import { limits } from '../../../shared/contracts/limits.ts'
import type { Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import { countTry, forgetTries } from '../../http/rate-limits.ts'
import { sendMail } from '../mail/mail.service.ts'
import { tokenInvalid } from './account.errors.ts'
import { endSignIns, findPersonByEmail, setPassword } from './account.queries.ts'
import { hashPassword } from './passwords.ts'
import { closeResets, findOpenReset, insertReset, takeReset } from './resets.queries.ts'
import { hashToken, newToken } from './tokens.ts'

type ResetDeps = Pick<Deps, 'db' | 'clock'>

/**
 * Asks for a link. The worker finds out whether the address is known (`openReset`), so that neither the answer
 * nor the time it takes tells.
 */
export async function requestPasswordReset({ db }: ResetDeps, email: string, network: string): Promise<void> {
  await countTry(db.pool, 'reset-network', network)
  await countTry(db.pool, 'reset-address', email)
  await db.inIdentity((tx) =>
    sendMail(tx, { clubId: null, to: email, template: 'password-reset', payload: {} }),
  )
}

/** Makes the secret of a reset link just before it is mailed; null where nobody has an account at the address. */
export async function openReset(tx: Tx, email: string, now: Date): Promise<string | null> {
  const person = await findPersonByEmail(tx, email)
  if (!person?.passwordHash) return null
  const { token, tokenHash } = newToken()
  const expiresAt = new Date(now.getTime() + limits.resetMinutes * 60_000)
  await insertReset(tx, { personId: person.id, tokenHash, expiresAt })
  return token
}

/** The address whose password a link sets. */
export async function readReset({ db, clock }: ResetDeps, token: string, network: string) {
  await countTry(db.pool, 'link-network', network)
  const reset = await db.inIdentity((tx) => findOpenReset(tx, hashToken(token), clock()))
  if (!reset) throw tokenInvalid()
  return { email: reset.email }
}

/** Sets the password, once for a link, and ends all the person's sign-ins. */
export async function finishPasswordReset(
  deps: ResetDeps,
  token: string,
  password: string,
  network: string,
): Promise<void> {
  const { email } = await readReset(deps, token, network)
  const passwordHash = await hashPassword(password)
  await deps.db.inIdentity(async (tx) => {
    const personId = await takeReset(tx, hashToken(token), deps.clock())
    if (!personId) throw tokenInvalid()
    await closeResets(tx, personId, deps.clock())
    await setPassword(tx, personId, passwordHash)
    await endSignIns(tx, personId)
  })
  await forgetTries(deps.db.pool, 'sign-in-address', email)
}
