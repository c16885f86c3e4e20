import { useQueryClient } from '@tanstack/react-query'
import { changePerson } from '../../../shared/contracts/people.ts'
import { startAs } from '../account/get-me.ts'
import { useAct } from '../use-act.ts'

/** An admin who deactivates themselves is signed out with it: there is nothing to read again. */
export function useDeactivateMyself() {
  const queryClient = useQueryClient()
  return useAct(changePerson, { refreshes: [], onDone: () => startAs(queryClient, null) })
}
