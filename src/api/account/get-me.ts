import { queryOptions, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query'
import { getMe, type Me } from '../../../shared/contracts/account.ts'
import type { Role } from '../../../shared/contracts/roles.ts'
import { ApiError } from '../api-error.ts'
import { call } from '../client.ts'

export const meKey = ['me'] as const

/**
 * Who is signed in; null for nobody. Once somebody is, nobody is an error like any "not signed in": the sign-in has
 * ended under a page that may hold unsaved work, which must not be swept away.
 */
export function meQuery(queryClient: QueryClient) {
  return queryOptions({
    queryKey: meKey,
    queryFn: async ({ signal }): Promise<Me | null> => {
      const me = await call(getMe, {}, { signal })
      if (me === null && queryClient.getQueryData<Me | null>(meKey))
        throw new ApiError('not-signed-in', 'Your sign-in has ended.')
      return me
    },
  })
}

export function useMe() {
  return useQuery(meQuery(useQueryClient()))
}

/** After a sign-in or sign-out: what else is cached belongs to who was there before. */
export function startAs(queryClient: QueryClient, me: Me | null): void {
  queryClient.removeQueries({ predicate: (query) => query.queryKey[0] !== meKey[0] })
  queryClient.setQueryData(meKey, me)
}

/** The roles of whoever is signed in; none for nobody. */
export function useRoles(): Role[] {
  return useMe().data?.roles ?? []
}
