import type { Access } from '../../shared/contracts/endpoint.ts'
import type { Role } from '../../shared/contracts/roles.ts'
import type { Caller } from './caller.ts'
import { notAllowed, notSignedIn } from './errors.ts'

/** Lets the caller through where the endpoint's `access` names one of their roles; throws 401 or 403 otherwise. */
export function authorise(access: Access, caller: Caller | undefined): Caller {
  if (!caller) throw notSignedIn()
  if (access === 'public' || access === 'signed-in') return caller
  if (!access.some((role: Role) => caller.roles.includes(role))) throw notAllowed()
  return caller
}
