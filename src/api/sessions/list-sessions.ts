import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query'
import type { z } from 'zod'
import { listSessions } from '../../../shared/contracts/sessions.ts'
import { call } from '../client.ts'
import { sessionKeys } from './session-keys.ts'

export type SessionsQuery = z.input<typeof listSessions.query>

export function sessionsQuery(query: SessionsQuery) {
  return queryOptions({
    queryKey: [...sessionKeys.lists, query],
    queryFn: ({ signal }) => call(listSessions, { query }, { signal }),
    placeholderData: keepPreviousData,
  })
}

export function useSessions(query: SessionsQuery) {
  return useQuery(sessionsQuery(query))
}
