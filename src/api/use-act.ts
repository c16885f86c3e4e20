import { useMutation, useQueryClient, type QueryKey, type UseMutationResult } from '@tanstack/react-query'
import { useState } from 'react'
import type { z } from 'zod'
import type { Endpoint } from '../../shared/contracts/endpoint.ts'
import { actKeys } from './act-keys.ts'
import { isApiError } from './api-error.ts'
import { call, type CallInput } from './client.ts'

interface ActOptions<Answer, Input> {
  /** Query keys, or their beginnings, that the act makes out of date. */
  refreshes: QueryKey[] | ((answer: Answer, input: Input) => QueryKey[])
  onDone?: (answer: Answer, input: Input) => void
}

/**
 * A mutation through the contract: bears an Idempotency-Key where the endpoint wants one, is never retried silently,
 * and is only done when everything it changed has been read again. A stale version refreshes too, so that the list
 * behind the form shows the newer state.
 */
export function useAct<
  P extends z.ZodObject,
  Q extends z.ZodObject,
  B extends z.ZodType,
  R extends z.ZodType,
>(
  endpoint: Endpoint<P, Q, B, R>,
  options: ActOptions<z.output<R>, CallInput<P, Q, B>>,
): UseMutationResult<z.output<R>, Error, CallInput<P, Q, B>> {
  const queryClient = useQueryClient()
  const [keys] = useState(() => actKeys())

  const refresh = (queryKeys: QueryKey[]) =>
    Promise.all(queryKeys.map((queryKey) => queryClient.invalidateQueries({ queryKey })))

  return useMutation({
    mutationFn: (input: CallInput<P, Q, B>) =>
      call(endpoint, input, endpoint.repeat === 'key' ? { idempotencyKey: keys.keyFor(input) } : {}),
    onSuccess: async (answer, input) => {
      const { refreshes } = options
      await refresh(typeof refreshes === 'function' ? refreshes(answer, input) : refreshes)
      options.onDone?.(answer, input)
    },
    onError: async (error) => {
      if (isApiError(error, 'stale-version') && Array.isArray(options.refreshes))
        await refresh(options.refreshes)
    },
    onSettled: (_answer, error) => keys.settle(error),
  })
}
