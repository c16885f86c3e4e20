import type { z } from 'zod'
import type { ChangePasswordForm, Me } from '../../../shared/contracts/account.ts'
import { enterClub } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { notSignedIn } from '../../http/errors.ts'
import { countTry } from '../../http/rate-limits.ts'
import { record } from '../audit/audit.service.ts'
import { wrongPassword } from './account.errors.ts'
import { endSignIns, findPasswordHash, readMe, setPassword } from './account.queries.ts'
import { hashPassword, passwordFits } from './passwords.ts'
import { closeResets } from './resets.queries.ts'

/** Who is signed in, to which club, as what. */
export async function describeMe({ db }: Pick<Deps, 'db'>, ctx: Caller): Promise<Me> {
  const me = await db.inClub(ctx, (tx) => readMe(tx, ctx.clubId, ctx.personId))
  if (!me) throw notSignedIn()
  return { ...me, roles: [...ctx.roles], athleteId: ctx.athleteId }
}

/** Sets a new password and ends the person's other sign-ins and open reset links. */
export async function changeOwnPassword(
  { db, clock }: Pick<Deps, 'db' | 'clock'>,
  ctx: Caller,
  form: z.output<typeof ChangePasswordForm>,
  keepSid: string,
): Promise<void> {
  await countTry(db.pool, 'password-person', ctx.personId)
  const present = await db.inIdentity((tx) => findPasswordHash(tx, ctx.personId))
  if (!(await passwordFits(present, form.current))) throw wrongPassword()
  const passwordHash = await hashPassword(form.next)
  await db.inIdentity(async (tx) => {
    await setPassword(tx, ctx.personId, passwordHash)
    await closeResets(tx, ctx.personId, clock())
    await endSignIns(tx, ctx.personId, keepSid)
    await enterClub(tx, ctx)
    await record(tx, ctx, 'password.change', 'person', ctx.personId)
  })
}
