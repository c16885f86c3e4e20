import { QueryClientProvider } from '@tanstack/react-query'
import { useMemo, useState, type ReactNode } from 'react'
import { Announcer } from '../components/announcer.tsx'
import { createQueryClient } from './query-client.ts'
import { SessionEndedContext } from './session-ended.ts'

export function Providers({ children }: { children: ReactNode }) {
  const [ended, setEnded] = useState(false)
  const [queryClient] = useState(() => createQueryClient(() => setEnded(true)))
  const session = useMemo(() => ({ ended, settle: () => setEnded(false) }), [ended])
  return (
    <QueryClientProvider client={queryClient}>
      <SessionEndedContext value={session}>
        <Announcer>{children}</Announcer>
      </SessionEndedContext>
    </QueryClientProvider>
  )
}
