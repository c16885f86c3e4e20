import type { Request, Response } from 'express'
import { promisify } from 'node:util'
import type { SignInForm } from '../../../shared/contracts/account.ts'
import type { z } from 'zod'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { networkOf } from '../../http/network.ts'
import { countTry, forgetTries, takeBackTry } from '../../http/rate-limits.ts'
import { cookieName } from '../../http/sign-in-session.ts'
import { wrongCredentials } from './account.errors.ts'
import { passport } from './passport.ts'

/** Checks address and password, within the limits of tries, and opens a sign-in session under a new id. */
export async function signInWithPassword(
  { db }: Pick<Deps, 'db'>,
  form: z.output<typeof SignInForm>,
  req: Request,
  res: Response,
): Promise<Caller> {
  const network = networkOf(req.ip)
  await countTry(db.pool, 'sign-in-network', network)
  await countTry(db.pool, 'sign-in-address', form.email)
  req.body = form
  const caller = await authenticate(req, res)
  if (!caller) throw wrongCredentials()
  await forgetTries(db.pool, 'sign-in-address', form.email)
  await takeBackTry(db.pool, 'sign-in-network', network)
  await openSession(req, caller)
  return caller
}

/** Opens a sign-in session for somebody whose identity was checked; the session id before it is worth nothing. */
export const openSession = (req: Request, caller: Caller): Promise<void> =>
  promisify<Caller, void>(req.logIn.bind(req))(caller)

/** Ends this sign-in, and takes its cookie away. */
export async function closeSession(req: Request, res: Response): Promise<void> {
  await promisify(req.session.destroy.bind(req.session))()
  res.clearCookie(cookieName)
}

function authenticate(req: Request, res: Response): Promise<Caller | false> {
  return new Promise((resolve, reject) => {
    const whenDone = (error: unknown, caller: Caller | false | undefined) =>
      error ? reject(error as Error) : resolve(caller ?? false)
    passport.authenticate('local', whenDone)(req, res, reject)
  })
}
