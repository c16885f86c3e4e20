import { QueryClient } from '@tanstack/react-query'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { streamHealth } from './stream-health.ts'
import { clubEventHandlers } from './use-club-events.ts'

/** A cache with one fetched query a key; says which are out of date. */
function cacheOf(...keys: string[][]) {
  const queryClient = new QueryClient()
  for (const key of keys) queryClient.setQueryData(key, 'as it was')
  const stale = () =>
    keys.filter((key) => queryClient.getQueryState(key)?.isInvalidated).map(([first]) => first)
  return { handlers: clubEventHandlers(queryClient), stale }
}
const keys = [
  ['sessions', 'list'],
  ['trials', 't'],
  ['landing-watch', '90'],
  ['results', 'mine'],
  ['athletes', 'list'],
  ['me'],
]

afterEach(() => streamHealth.set(false))

describe('clubEventHandlers(queryClient)', () => {
  it('a session makes out of date what shows trials and results, and not who is signed in', async () => {
    const { handlers, stale } = cacheOf(...keys)
    handlers.onEvent({ kind: 'session', id: null })
    await vi.waitFor(() =>
      expect(stale()).toEqual(['sessions', 'trials', 'landing-watch', 'results', 'athletes']),
    )
  })

  it('a change of athletes or of the club’s limits makes out of date what shows them', async () => {
    const { handlers, stale } = cacheOf(...keys)
    handlers.onEvent({ kind: 'athletes', id: null })
    await vi.waitFor(() => expect(stale()).toEqual(['sessions', 'trials', 'landing-watch', 'athletes']))
  })

  it('reads everything again when the stream opens, for what was missed, and knows whether it is heard', async () => {
    const { handlers, stale } = cacheOf(...keys)
    handlers.onOpen()
    expect(streamHealth.isOpen()).toBe(true)
    await vi.waitFor(() => expect(stale()).toHaveLength(5))
    handlers.onLost()
    expect(streamHealth.isOpen()).toBe(false)
  })
})
