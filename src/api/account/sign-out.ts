import { useQueryClient } from '@tanstack/react-query'
import { signOut } from '../../../shared/contracts/account.ts'
import { useAct } from '../use-act.ts'
import { startAs } from './get-me.ts'

export function useSignOut() {
  const queryClient = useQueryClient()
  return useAct(signOut, { refreshes: [], onDone: () => startAs(queryClient, null) })
}
