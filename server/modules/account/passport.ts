import type { Request } from 'express'
import passportPackage from 'passport'
import { Strategy as LocalStrategy } from 'passport-local'
import { z } from 'zod'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { findCaller } from './caller.service.ts'
import { checkCredentials } from './credentials.service.ts'

/** What a sign-in session holds: who, and in which club. Roles are read anew at every request. */
const SignedIn = z.object({ personId: z.uuid(), clubId: z.uuid() })

const depsOf = (req: Request) => req.app.locals.deps as Deps

/** Passport, an instance of our own: sessions hold ids, and each request finds what they may do now. */
export const passport = new passportPackage.Passport()

passport.serializeUser((caller, done) => {
  const signedIn: z.infer<typeof SignedIn> = { personId: caller.personId, clubId: caller.clubId }
  done(null, signedIn)
})

// A membership that is gone or inactive is `false`: the person is signed out at this very request.
passport.deserializeUser(
  (req: Request, kept: unknown, done: (error: unknown, user?: Caller | false) => void) => {
    const signedIn = SignedIn.safeParse(kept)
    if (!signedIn.success) return done(null, false)
    findCaller(depsOf(req), signedIn.data).then((caller) => done(null, caller ?? false), done)
  },
)

passport.use(
  new LocalStrategy({ usernameField: 'email', passReqToCallback: true }, (req, email, password, done) => {
    checkCredentials(depsOf(req), { email, password }).then((caller) => done(null, caller ?? false), done)
  }),
)
