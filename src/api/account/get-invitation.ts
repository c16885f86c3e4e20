import { queryOptions, useQuery } from '@tanstack/react-query'
import { getInvitation } from '../../../shared/contracts/account.ts'
import { call } from '../client.ts'

export function invitationQuery(token: string) {
  return queryOptions({
    queryKey: ['invitation', token],
    queryFn: ({ signal }) => call(getInvitation, { params: { token } }, { signal }),
  })
}

export function useInvitation(token: string) {
  return useQuery(invitationQuery(token))
}
