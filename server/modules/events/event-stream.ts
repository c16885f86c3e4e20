import type { Response } from 'express'
import type { ClubEvent } from '../../../shared/contracts/events.ts'
import type { Caller } from '../../http/caller.ts'
import type { ClubEvents } from './club-events.ts'
import type { Notice } from './notify.ts'

/** Notices within this time are told together: forty files at once are one refetch, not forty. */
const gatherMs = 100
/** A sign of life, below the patience of usual proxies. */
const heartbeatMs = 20_000
/** A stream ends after this time and the browser asks anew: whoever lost their place hears no more. */
const longestMs = 10 * 60_000

/**
 * Answers with server-sent events: ids of what changed in the caller's club, for as long as the browser listens.
 * The answer begins when the server hears: what the browser reads after that beginning is never older than an
 * event that it missed.
 */
export async function streamEvents(events: ClubEvents, ctx: Caller, res: Response): Promise<void> {
  // Gone before its turn came: nobody would tell when to stop listening.
  if (res.closed) return
  const gathered = new Map<string, ClubEvent>()
  let gathering: NodeJS.Timeout | undefined
  const flush = () => {
    gathering = undefined
    for (const event of gathered.values()) res.write(`data: ${JSON.stringify(event)}\n\n`)
    gathered.clear()
  }
  const add = ({ kind, id }: ClubEvent) => {
    gathered.set(`${kind}/${id}`, { kind, id })
    gathering ??= setTimeout(flush, gatherMs)
  }
  const { ready, stop } = events.listen({
    onNotice: (notice) => mayHear(ctx, notice) && add(notice),
    // The browser asks anew, and refetches everything on its screen.
    onLost: () => res.headersSent && res.end(),
  })
  res.on('close', () => {
    stop()
    clearTimeout(gathering)
  })
  await ready
  if (!res.closed) begin(res)
}

function begin(res: Response): void {
  res.writeHead(200, {
    'Content-Type': 'text/event-stream',
    // `no-transform` keeps the compression, which would hold events back, away.
    'Cache-Control': 'no-store, no-transform',
    'X-Accel-Buffering': 'no',
  })
  res.write('retry: 1000\n\n')
  const heartbeat = setInterval(() => res.write(':\n\n'), heartbeatMs)
  const longest = setTimeout(() => res.end(), longestMs)
  res.on('close', () => {
    clearInterval(heartbeat)
    clearTimeout(longest)
  })
}

const mayHear = (ctx: Caller, { clubId, audience }: Notice) =>
  clubId === ctx.clubId && (audience === 'everybody' || ctx.capabilities.includes('staff'))
