import { Navigate } from 'react-router-dom'
import { useMe } from '../api/account/get-me.ts'
import { startPathFor } from './navigation.ts'

/** The shell has made sure that somebody is signed in. */
export function HomeRedirect() {
  const me = useMe().data
  return me ? <Navigate to={startPathFor(me.roles)} replace /> : null
}
