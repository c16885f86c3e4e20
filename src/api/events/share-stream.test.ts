import { describe, expect, it, vi } from 'vitest'
import type { ClubEvent } from '../../../shared/contracts/events.ts'
import type { StreamHandlers } from './open-stream.ts'
import { shareStream, type Sharing } from './share-stream.ts'

/** A browser with tabs: one lock, one channel, and a list of the streams that were opened. */
function browser() {
  type Tab = ReturnType<Sharing['channel']>
  const tabs = new Set<Tab>()
  const streams: { handlers: StreamHandlers; closed: boolean }[] = []
  let held: Promise<unknown> = Promise.resolve()
  const sharing: Sharing = {
    locks: {
      request: (async (_name: string, options: LockOptions, work: () => Promise<void>) => {
        const turn = held.then(() => (options.signal?.aborted ? undefined : work()))
        held = turn
        return turn
      }) as LockManager['request'],
    },
    channel: () => {
      const tab: Tab = {
        onmessage: null,
        close: () => tabs.delete(tab),
        postMessage: (data) => {
          for (const other of tabs) {
            if (other !== tab)
              other.onmessage?.call(other as BroadcastChannel, new MessageEvent('message', { data }))
          }
        },
      }
      tabs.add(tab)
      return tab
    },
    open: (handlers) => {
      const stream = { handlers, closed: false }
      streams.push(stream)
      return () => {
        stream.closed = true
      }
    },
  }
  return { sharing, streams }
}

const handlers = () => ({ onOpen: vi.fn(), onLost: vi.fn(), onEvent: vi.fn() })
const event: ClubEvent = { kind: 'session', id: '6f9619ff-8b86-4d01-b42d-00cf4fc964ff' }

describe('shareStream(sharing, handlers)', () => {
  it('opens one stream for two tabs and tells both what it hears', async () => {
    const { sharing, streams } = browser()
    const first = handlers()
    const second = handlers()
    shareStream(sharing, first)
    shareStream(sharing, second)
    await vi.waitFor(() => expect(streams).toHaveLength(1))
    streams[0]!.handlers.onOpen()
    streams[0]!.handlers.onEvent(event)
    expect(first.onEvent).toHaveBeenCalledWith(event)
    expect(second.onEvent).toHaveBeenCalledWith(event)
    expect(second.onOpen).toHaveBeenCalledOnce()
  })

  it('hands the stream to the next tab when the first one goes away', async () => {
    const { sharing, streams } = browser()
    const end = shareStream(sharing, handlers())
    const second = handlers()
    shareStream(sharing, second)
    await vi.waitFor(() => expect(streams).toHaveLength(1))
    end()
    await vi.waitFor(() => expect(streams).toHaveLength(2))
    expect(streams[0]!.closed).toBe(true)
    streams[1]!.handlers.onEvent(event)
    expect(second.onEvent).toHaveBeenCalledWith(event)
  })

  it('tells a tab that comes later that the stream is open', async () => {
    const { sharing, streams } = browser()
    shareStream(sharing, handlers())
    await vi.waitFor(() => expect(streams).toHaveLength(1))
    streams[0]!.handlers.onOpen()
    const later = handlers()
    shareStream(sharing, later)
    expect(later.onOpen).toHaveBeenCalledOnce()
  })

  it('opens a stream of its own where the browser has no locks', () => {
    const { sharing, streams } = browser()
    shareStream({ ...sharing, locks: undefined }, handlers())
    expect(streams).toHaveLength(1)
  })
})
