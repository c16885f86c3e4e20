import pg from 'pg'
import { z } from 'zod'
import { ClubEvent } from '../../../shared/contracts/events.ts'
import { Id } from '../../../shared/contracts/fields.ts'
import type { Deps } from '../../deps.ts'
import { eventChannel, type Notice } from './notify.ts'

const NoticeSchema = ClubEvent.extend({ clubId: Id, audience: z.enum(['staff', 'everybody']) })

export interface Listener {
  onNotice(notice: Notice): void
  /** The connection is gone: notices may be missed from now on. */
  onLost(): void
}

interface Connection {
  client: pg.Client
  ready: Promise<unknown>
}

/**
 * What changed in any club, by one LISTEN connection a process, outside the pool. It is open while somebody
 * listens. When it is lost, so is everybody who listened: their browsers come again and open the next one, and
 * refetch what they show.
 */
export function createClubEvents({ config, log }: Pick<Deps, 'config' | 'log'>) {
  const listeners = new Set<Listener>()
  let connection: Connection | null = null

  function connect(): Connection {
    const client = new pg.Client({
      connectionString: config.databaseUrl,
      application_name: 'underfoot-events',
      keepAlive: true,
    })
    const opened = { client, ready: client.connect().then(() => client.query(`listen ${eventChannel}`)) }
    client.on('notification', ({ payload }) => tell(payload))
    client.on('error', () => undefined).on('end', () => lose(opened))
    opened.ready.catch((error: unknown) => {
      log.warn({ err: error }, 'cannot listen for events')
      lose(opened)
    })
    return opened
  }

  function lose(lost: Connection): void {
    if (connection !== lost) return
    close()
    for (const listener of [...listeners]) listener.onLost()
  }

  function close(): void {
    connection?.client.end().catch(() => undefined)
    connection = null
  }

  function tell(payload: string | undefined): void {
    const notice = NoticeSchema.parse(JSON.parse(payload ?? ''))
    for (const listener of listeners) listener.onNotice(notice)
  }

  return {
    /** Listens until `stop`; from `ready` on nothing is missed. */
    listen(listener: Listener): { ready: Promise<unknown>; stop: () => void } {
      listeners.add(listener)
      connection ??= connect()
      const stop = () => {
        listeners.delete(listener)
        if (listeners.size === 0) close()
      }
      return { ready: connection.ready, stop }
    },
  }
}
export type ClubEvents = ReturnType<typeof createClubEvents>
