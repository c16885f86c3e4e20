import { ClubEvent, getEvents } from '../../../shared/contracts/events.ts'

export interface StreamHandlers {
  onOpen: () => void
  onLost: () => void
  onEvent: (event: ClubEvent) => void
}

/** Waits before a stream that the server refused is tried again, ms; the browser itself retries a lost one. */
const retryMs = { first: 2_000, most: 60_000 }

/** Opens the club's stream of events and keeps it open until the function it returns is called. */
export function openStream(handlers: StreamHandlers): () => void {
  let source: EventSource | null = null
  let timer: ReturnType<typeof setTimeout> | undefined
  let waitMs = retryMs.first

  const open = () => {
    source = new EventSource(getEvents.path)
    source.onopen = () => {
      waitMs = retryMs.first
      handlers.onOpen()
    }
    source.onmessage = ({ data }) => {
      const event = readEvent(data)
      if (event) handlers.onEvent(event)
    }
    source.onerror = () => {
      handlers.onLost()
      if (source?.readyState !== EventSource.CLOSED) return
      timer = setTimeout(open, waitMs)
      waitMs = Math.min(waitMs * 2, retryMs.most)
    }
  }
  open()
  return () => {
    clearTimeout(timer)
    source?.close()
  }
}

/** null for what this client does not know: a newer server may say more. */
function readEvent(data: unknown): ClubEvent | null {
  try {
    return ClubEvent.safeParse(JSON.parse(String(data))).data ?? null
  } catch {
    return null
  }
}
