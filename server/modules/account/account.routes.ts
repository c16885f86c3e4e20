import {
  acceptInvitation,
  changePassword,
  checkReset,
  finishReset,
  getInvitation,
  getMe,
  requestReset,
  signIn,
  signOut,
} from '../../../shared/contracts/account.ts'
import { implement, implementPublic, type Route } from '../../http/implement.ts'
import { networkOf } from '../../http/network.ts'
import { changeOwnPassword, describeMe } from './account.service.ts'
import { acceptByToken, readInvitation } from './invitations.service.ts'
import { finishPasswordReset, readReset, requestPasswordReset } from './resets.service.ts'
import { closeSession, openSession, signInWithPassword } from './sign-in.ts'

export const accountRoutes: Route[] = [
  implementPublic(signIn, async ({ deps, body, req, res }) =>
    describeMe(deps, await signInWithPassword(deps, body, req, res)),
  ),
  implementPublic(signOut, async ({ req, res }) => {
    await closeSession(req, res)
    return null
  }),
  implementPublic(getMe, async ({ deps, req }) => (req.user ? describeMe(deps, req.user) : null)),
  implement(changePassword, async ({ deps, ctx, body, req }) => {
    await changeOwnPassword(deps, ctx, body, req.sessionID)
    return null
  }),
  implementPublic(requestReset, async ({ deps, body, req }) => {
    await requestPasswordReset(deps, body.email, networkOf(req.ip))
    return null
  }),
  implementPublic(checkReset, ({ deps, params, req }) => readReset(deps, params.token, networkOf(req.ip))),
  implementPublic(finishReset, async ({ deps, params, body, req }) => {
    await finishPasswordReset(deps, params.token, body.password, networkOf(req.ip))
    return null
  }),
  implementPublic(getInvitation, ({ deps, params, req }) =>
    readInvitation(deps, params.token, networkOf(req.ip)),
  ),
  implementPublic(acceptInvitation, async ({ deps, params, body, req }) => {
    const caller = await acceptByToken(deps, params.token, body, networkOf(req.ip))
    await openSession(req, caller)
    return describeMe(deps, caller)
  }),
]
