import { queryOptions, useQuery } from '@tanstack/react-query'
import { getSession, type SessionSheet } from '../../../shared/contracts/sessions.ts'
import { call } from '../client.ts'
import { streamHealth } from '../events/stream-health.ts'
import { sessionKeys } from './session-keys.ts'

/**
 * How often a sheet is read again behind the stream of events, ms: seldom while the stream is heard, for what it
 * might have missed; more often while it is not, and while files are being read.
 */
const pollMs = { heard: 15_000, unheard: 30_000, unheardWorking: 2_000 }

export function sessionQuery(sessionId: string) {
  return queryOptions({
    queryKey: sessionKeys.one(sessionId),
    queryFn: ({ signal }) => call(getSession, { params: { sessionId } }, { signal }),
    refetchInterval: ({ state }) => {
      const working = state.data !== undefined && isWorking(state.data)
      if (streamHealth.isOpen()) return working ? pollMs.heard : false
      return working ? pollMs.unheardWorking : pollMs.unheard
    },
  })
}

export function useSession(sessionId: string) {
  return useQuery(sessionQuery(sessionId))
}

/** Whether files of the sheet still arrive or are to be read, or trials to be analysed. */
function isWorking(sheet: SessionSheet): boolean {
  return (
    sheet.uploads.some((upload) => upload.state === 'waiting' || upload.arriving) ||
    sheet.trials.some((trial) => trial.analysis === null)
  )
}
