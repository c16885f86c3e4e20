import { z } from 'zod'
import { endpoint, noContent } from './endpoint.ts'
import { Email, Id, Name, Password } from './fields.ts'
import { Role } from './roles.ts'

/** Who is signed in, to which club, as what. */
export const Me = z.strictObject({
  person: z.strictObject({ id: Id, name: z.string(), email: z.string() }),
  club: z.strictObject({ id: Id, name: z.string(), timeZone: z.string(), demo: z.boolean() }),
  roles: z.array(Role),
  /** The athlete record of this person in this club, if any. */
  athleteId: Id.nullable(),
})
export type Me = z.infer<typeof Me>

export const SignInForm = z.strictObject({
  email: Email,
  password: z.string().min(1, 'Give your password').max(200),
})

export const signIn = endpoint({
  method: 'POST',
  path: '/api/sign-in',
  access: 'public',
  body: SignInForm,
  response: Me,
  repeat: 'natural',
})
export const signOut = endpoint({
  method: 'POST',
  path: '/api/sign-out',
  access: 'public',
  response: noContent,
  repeat: 'natural',
})
/** Null for nobody: every page asks, also of those who have yet to sign in. */
export const getMe = endpoint({ method: 'GET', path: '/api/me', access: 'public', response: Me.nullable() })

export const ChangePasswordForm = z.strictObject({
  current: z.string().min(1, 'Give your password').max(200),
  next: Password,
})
export const changePassword = endpoint({
  method: 'POST',
  path: '/api/me/password',
  access: 'signed-in',
  // A person's own, whatever the club's standing.
  whileReadingOnly: 'allowed',
  body: ChangePasswordForm,
  response: noContent,
  repeat: 'natural',
})

/** Always answered alike, whether the address is known or not. */
export const requestReset = endpoint({
  method: 'POST',
  path: '/api/resets',
  access: 'public',
  body: z.strictObject({ email: Email }),
  response: noContent,
  repeat: 'natural',
})
const Token = z.strictObject({ token: z.string().min(20).max(100) })
export const checkReset = endpoint({
  method: 'GET',
  path: '/api/resets/:token',
  access: 'public',
  params: Token,
  response: z.strictObject({ email: z.string() }),
})
export const finishReset = endpoint({
  method: 'POST',
  path: '/api/resets/:token',
  access: 'public',
  params: Token,
  body: z.strictObject({ password: Password }),
  response: noContent,
  repeat: 'natural',
})

export const InvitationView = z.strictObject({
  clubName: z.string(),
  name: z.string(),
  email: z.string(),
  roles: z.array(Role),
  /** True where the address has an account already: the person then signs in with its password to accept. */
  hasAccount: z.boolean(),
})
export const getInvitation = endpoint({
  method: 'GET',
  path: '/api/invitations/:token',
  access: 'public',
  params: Token,
  response: InvitationView,
})
/** Makes the account (or, for a known address, checks its password) and signs in. */
export const acceptInvitation = endpoint({
  method: 'POST',
  path: '/api/invitations/:token',
  access: 'public',
  params: Token,
  body: z.strictObject({ name: Name, password: Password }),
  response: Me,
  repeat: 'natural',
})
