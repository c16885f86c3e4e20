import type { publishSession } from '../../../shared/contracts/sessions.ts'
import type { ResponseOf } from '../../../shared/contracts/endpoint.ts'
import type { Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { staleVersion } from '../../http/errors.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import { sendMail } from '../mail/mail.service.ts'
import { rebuildPublished } from '../results/results.service.ts'
import {
  currentPins,
  insertPublication,
  type Pin,
  peopleOfAthletes,
  pinsToPublish,
} from './publications.queries.ts'
import { nothingToPublish } from './sessions.errors.ts'
import { updateSession } from './sessions.queries.ts'
import { requireSummary } from './sessions.service.ts'

export interface PublishOptions {
  /** Off where a club's history is brought in: nobody wants mail about last year. */
  mail: boolean
}

/**
 * Pins the trials that count, each with its present analysis: what athletes read until the next publication,
 * whatever is changed or recomputed meanwhile. Publishing again is the correction.
 */
export async function publish(
  deps: Deps,
  ctx: Caller,
  { sessionId, version }: { sessionId: string; version: number },
  options: PublishOptions = { mail: true },
): Promise<ResponseOf<typeof publishSession>> {
  const { clubId, personId } = ctx
  return deps.db.inClub(ctx, async (tx) => {
    const publishedAt = deps.clock()
    // First of all, so that of two who publish at once the second waits here and then is told.
    const mayPublish = await updateSession(tx, { clubId, sessionId, version }, { publishedAt })
    if (!mayPublish) throw staleVersion(await requireSummary(tx, ctx, sessionId))
    const pins = await pinsToPublish(tx, clubId, sessionId)
    if (pins.length === 0) throw nothingToPublish()
    const before = await currentPins(tx, clubId, sessionId)
    await insertPublication(tx, { clubId, sessionId, publishedBy: personId, publishedAt }, pins)
    await rebuildPublished(tx, ctx, sessionId)
    await record(tx, ctx, 'session.publish', 'session', sessionId, { trials: pins.length })
    await notify(tx, clubId, { kind: 'session', id: sessionId }, 'everybody')
    const summary = await requireSummary(tx, ctx, sessionId)
    if (options.mail) await tellAthletes(tx, clubId, athletesWithNews(before, pins))
    return { ...summary, athletesPublished: athletesOf(pins).length, trialsPublished: pins.length }
  })
}

/** True where publishing again would change what athletes read. */
export async function wouldChange(tx: Tx, clubId: string, sessionId: string): Promise<boolean> {
  const before = await currentPins(tx, clubId, sessionId)
  if (before.length === 0) return false
  return athletesWithNews(before, await pinsToPublish(tx, clubId, sessionId)).length > 0
}

const athletesOf = (pins: readonly Pin[]) => [...new Set(pins.map(({ athleteId }) => athleteId))]

/** Whose published trials differ between the two. */
function athletesWithNews(before: readonly Pin[], after: readonly Pin[]): string[] {
  const key = ({ trialId, analysisId, athleteId }: Pin) => `${trialId}/${analysisId}/${athleteId}`
  const [old, fresh] = [new Set(before.map(key)), new Set(after.map(key))]
  return athletesOf([
    ...before.filter((pin) => !fresh.has(key(pin))),
    ...after.filter((pin) => !old.has(key(pin))),
  ])
}

async function tellAthletes(tx: Tx, clubId: string, athleteIds: string[]): Promise<void> {
  const people = await peopleOfAthletes(tx, clubId, athleteIds)
  for (const { email } of people) {
    await sendMail(tx, { clubId, to: email, template: 'results-published', payload: {} })
  }
}
