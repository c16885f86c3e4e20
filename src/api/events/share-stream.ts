import type { ClubEvent } from '../../../shared/contracts/events.ts'
import type { StreamHandlers } from './open-stream.ts'

const sharedName = 'underfoot-club-events'

type Message = { kind: 'opened' } | { kind: 'lost' } | { kind: 'event'; event: ClubEvent } | { kind: 'asked' }

export interface Sharing {
  /** Absent on pages that are not served securely: then every tab has a stream of its own. */
  locks: Pick<LockManager, 'request'> | undefined
  channel: (name: string) => Pick<BroadcastChannel, 'postMessage' | 'close' | 'onmessage'>
  open: (handlers: StreamHandlers) => () => void
}

/**
 * One stream for all tabs of a browser: the tab that holds the lock opens it and passes on what it hears; when
 * that tab goes away the next one in line takes over. Returns what ends this tab's part.
 */
export function shareStream(sharing: Sharing, handlers: StreamHandlers): () => void {
  const channel = sharing.channel(sharedName)
  const ended = new AbortController()
  let isOpen = false

  const receive = (message: Message) => {
    if (message.kind === 'opened') handlers.onOpen()
    if (message.kind === 'lost') handlers.onLost()
    if (message.kind === 'event') handlers.onEvent(message.event)
    if (message.kind === 'asked' && isOpen) channel.postMessage({ kind: 'opened' } satisfies Message)
  }
  const tell = (message: Message) => {
    isOpen = message.kind === 'lost' ? false : isOpen || message.kind === 'opened'
    receive(message)
    channel.postMessage(message)
  }
  channel.onmessage = ({ data }: MessageEvent<Message>) => receive(data)
  channel.postMessage({ kind: 'asked' } satisfies Message)

  const lead = () =>
    new Promise<void>((release) => {
      if (ended.signal.aborted) return release()
      const close = sharing.open({
        onOpen: () => tell({ kind: 'opened' }),
        onLost: () => tell({ kind: 'lost' }),
        onEvent: (event) => tell({ kind: 'event', event }),
      })
      ended.signal.addEventListener('abort', () => {
        close()
        release()
      })
    })
  if (sharing.locks) sharing.locks.request(sharedName, { signal: ended.signal }, lead).catch(passOverAbort)
  else void lead()

  return () => {
    ended.abort()
    channel.close()
  }
}

/** Ending while still in line for the lock rejects the request; that is no fault. */
function passOverAbort(error: unknown) {
  if (!(error instanceof DOMException && error.name === 'AbortError')) throw error
}
