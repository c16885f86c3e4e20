import type { BodyOf } from '../../../shared/contracts/endpoint.ts'
import type { Analysis, moveEvents, Trial } from '../../../shared/contracts/trials.ts'
import { eventOrder, findMisplaced, type MovedEvents } from '../../../shared/mechanics/events/event-order.ts'
import { engineVersion } from '../../../shared/mechanics/version.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { invalidRequest, staleVersion } from '../../http/errors.ts'
import { sendJobs } from '../../jobs/queue.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import { mayMoveEvents } from './may-move-events.ts'
import { insertEventMove } from './moved-events.queries.ts'
import { engineOutdated, eventMisplaced, mayNotMoveEvents } from './trials.errors.ts'
import { findTrial, updateTrial } from './trials.queries.ts'
import { missing, staffTrial } from './trials.service.ts'

/**
 * Sets which events stand where a person put them and has the trial analysed anew. The earlier states are kept, and
 * so is the earlier analysis, which stays in force until the new one is there.
 */
export function move(
  deps: Deps,
  ctx: Caller,
  trialId: string,
  { version, events, reason, engineVersion: shownBy }: BodyOf<typeof moveEvents>,
): Promise<Trial> {
  const { clubId } = ctx
  return deps.db.inClub(ctx, async (tx) => {
    const row = await findTrial(tx, clubId, trialId)
    if (!row) throw missing()
    if (!mayMoveEvents(ctx, row)) throw mayNotMoveEvents()
    if (shownBy !== engineVersion) throw engineOutdated()
    const before = await staffTrial(tx, ctx, trialId)
    const mayChange = await updateTrial(tx, { clubId, trialId, version }, {})
    if (!mayChange) throw staleVersion(await staffTrial(tx, ctx, trialId))
    requireInOrder(events, before)
    const stood = stoodBefore(events, before)
    if (Object.keys(stood).length === 0)
      throw invalidRequest('Every event stands where you put it already.', { events: 'Move an event first' })
    const moved = { clubId, trialId, events, stood, reason, movedBy: ctx.personId }
    await insertEventMove(tx, moved)
    const action = Object.keys(events).length > 0 ? 'trial.move-events' : 'trial.events-automatic'
    await record(tx, ctx, action, 'trial', trialId, { events, stood })
    await sendJobs(tx, 'analyse-trial', { version: 1, clubId, trialId })
    await notify(tx, clubId, { kind: 'session', id: row.sessionId })
    return staffTrial(tx, ctx, trialId)
  })
}

/** Moved events against the others as the engine placed them; one that goes back to automatic is not in the way. */
function requireInOrder(events: MovedEvents, { analysis, recording }: Trial): void {
  const standing = Object.fromEntries(
    eventOrder.flatMap((name) => {
      const event = analysis?.events[name]
      return event && analysis.movedEvents[name] === undefined ? [[name, event.timeS]] : []
    }),
  )
  const endS = (recording.sampleCount - 1) / recording.sampleRateHz
  const misplaced = findMisplaced(events, standing, endS)
  if (misplaced) throw eventMisplaced(misplaced)
}

/** Where each event that this changes stood before: as it was moved, or as the engine placed it. */
function stoodBefore(events: MovedEvents, { eventMoves, analysis }: Trial) {
  const earlier: MovedEvents = eventMoves[0]?.events ?? {}
  const changed = eventOrder.filter((name) => events[name] !== earlier[name])
  return Object.fromEntries(changed.map((name) => [name, earlier[name] ?? standsAt(analysis, name)]))
}

const standsAt = (analysis: Analysis | null, name: keyof MovedEvents) => analysis?.events[name]?.timeS ?? null
