import { queryOptions, useQuery } from '@tanstack/react-query'
import { listPeople } from '../../../shared/contracts/people.ts'
import { call } from '../client.ts'

export const peopleKey = ['people'] as const

export function peopleQuery() {
  return queryOptions({ queryKey: peopleKey, queryFn: ({ signal }) => call(listPeople, {}, { signal }) })
}

/** The people of the club and the open invitations. */
export function usePeople() {
  return useQuery(peopleQuery())
}
