import pg from 'pg'
import { z } from 'zod'
import { ClubEvent } from '../../../shared/contracts/events.ts'
import { Id } from '../../../shared/contracts/fields.ts'
import type { Deps } from '../../deps.ts'
import { eventChannel, type Notice } from './notify.ts'

const NoticeSchema = ClubEvent.extend({ clubId: Id, audience: z.enum(['staff', 'everybody']) })

/** Pause before listening again after the connection was lost. */
const againMs = 1000

export interface Listener {
  onNotice(notice: Notice): void
  /** Notices may have been missed: the connection was lost, and is there again. */
  onGap(): void
}

/**
 * What changed in any club, by one LISTEN connection a process, outside the pool. It is open while somebody
 * listens, and comes back by itself when it is lost.
 */
export function createClubEvents({ config, log }: Pick<Deps, 'config' | 'log'>) {
  const listeners = new Set<Listener>()
  let client: pg.Client | null = null

  async function open(isAgain: boolean): Promise<void> {
    const opening = new pg.Client({
      connectionString: config.databaseUrl,
      application_name: 'underfoot-events',
      keepAlive: true,
    })
    client = opening
    opening.on('error', () => undefined)
    opening.on('end', () => lost(opening))
    opening.on('notification', ({ payload }) => tell(payload))
    try {
      await opening.connect()
      await opening.query(`listen ${eventChannel}`)
      if (isAgain) for (const listener of listeners) listener.onGap()
    } catch (error) {
      log.warn({ err: error }, 'cannot listen for events')
      lost(opening)
    }
  }

  function lost(which: pg.Client): void {
    if (client !== which) return
    client = null
    which.end().catch(() => undefined)
    if (listeners.size > 0)
      setTimeout(() => listeners.size > 0 && !client && void open(true), againMs).unref()
  }

  function tell(payload: string | undefined): void {
    const notice = NoticeSchema.parse(JSON.parse(payload ?? ''))
    for (const listener of listeners) listener.onNotice(notice)
  }

  return {
    /** Listens until the returned function is called. */
    listen(listener: Listener): () => void {
      listeners.add(listener)
      if (!client) void open(false)
      return () => {
        listeners.delete(listener)
        const unused = listeners.size === 0 ? client : null
        if (!unused) return
        client = null
        unused.end().catch(() => undefined)
      }
    },
  }
}
export type ClubEvents = ReturnType<typeof createClubEvents>
