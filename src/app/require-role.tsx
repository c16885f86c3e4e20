import { Outlet } from 'react-router-dom'
import type { Role } from '../../shared/contracts/roles.ts'
import { useMe } from '../api/account/get-me.ts'
import { ErrorPage } from './error-page.tsx'

/** The server decides what is answered; this only spares a person a page that cannot work for them. */
export function RequireRole({ roles }: { roles: readonly Role[] }) {
  const me = useMe().data
  if (me?.roles.some((role) => roles.includes(role))) return <Outlet />
  return <ErrorPage code="not-allowed" />
}
