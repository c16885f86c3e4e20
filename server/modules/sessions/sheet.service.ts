import type { SessionSheet } from '../../../shared/contracts/sessions.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { meansOfSession } from '../results/results.service.ts'
import { trialsOfSession } from '../trials/trials.service.ts'
import { uploadsOfSession } from '../uploads/uploads.service.ts'
import { lastPublisher } from './publications.queries.ts'
import { wouldChange } from './publish.service.ts'
import { athletesOfSession, squadIdsOfSession } from './session-squads.queries.ts'
import { requireSession, requireSummary } from './sessions.service.ts'

/** The Session sheet: everything of a session in one answer, as one moment. */
export function sheet(deps: Deps, ctx: Caller, sessionId: string): Promise<SessionSheet> {
  const { clubId } = ctx
  return deps.db.atOneMoment(ctx, async (tx) => {
    const summary = await requireSummary(tx, ctx, sessionId)
    const { note } = await requireSession(tx, ctx, sessionId)
    const means = await meansOfSession(tx, ctx, sessionId)
    const athletes = await athletesOfSession(tx, clubId, sessionId)
    return {
      session: {
        ...summary,
        note,
        squadIds: await squadIdsOfSession(tx, clubId, sessionId),
        publishedByName: await lastPublisher(tx, clubId, sessionId),
      },
      athletes: athletes.map(({ id, name }) => ({ athleteId: id, name, means: means.get(id) ?? {} })),
      trials: await trialsOfSession(tx, clubId, sessionId),
      uploads: await uploadsOfSession(tx, clubId, sessionId),
      changedSincePublished: await wouldChange(tx, clubId, sessionId),
    }
  })
}
