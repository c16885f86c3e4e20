import { createContext, use } from 'react'

export interface SessionEnded {
  /** True from the first "not signed in" under a signed-in page until the next sign-in. */
  ended: boolean
  settle: () => void
}

export const SessionEndedContext = createContext<SessionEnded>({ ended: false, settle: () => {} })

export function useSessionEnded(): SessionEnded {
  return use(SessionEndedContext)
}
