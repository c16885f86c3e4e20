import connectPgSimple from 'connect-pg-simple'
import type { RequestHandler } from 'express'
import session from 'express-session'
import type { Deps } from '../deps.ts'

const dayMs = 24 * 3600 * 1000
export const cookieName = 'underfoot'

/** Sign-in sessions in PostgreSQL, the same for every web process, behind a signed cookie. */
export function signInSession({ config, db, log }: Pick<Deps, 'config' | 'db' | 'log'>): RequestHandler {
  const Store = connectPgSimple(session)
  const store = new Store({
    pool: db.pool,
    schemaName: 'identity',
    tableName: 'sign_in_sessions',
    // A sign-in lasts a fixed time, so that a request only reads it.
    disableTouch: true,
    pruneSessionInterval: config.mode === 'test' ? false : 15 * 60,
    errorLog: (message: unknown, error: unknown) => log.warn({ err: error ?? message }, 'sign-in sessions'),
  })
  return session({
    store,
    name: cookieName,
    secret: config.sessionSecret,
    resave: false,
    saveUninitialized: false,
    cookie: {
      httpOnly: true,
      sameSite: 'lax',
      secure: config.mode === 'production',
      maxAge: config.sessionDays * dayMs,
    },
  })
}
