import type { Access } from '../../shared/contracts/endpoint.ts'
import type { Role } from '../../shared/contracts/roles.ts'

/** Whether somebody with these roles may call an endpoint: what they may not, they are not offered. */
export function mayCall(endpoint: { access: Access }, held: readonly Role[]): boolean {
  const { access } = endpoint
  return typeof access === 'string' || access.some((role) => held.includes(role))
}
