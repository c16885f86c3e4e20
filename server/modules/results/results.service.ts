import type { MeanFigure, ResultPoint } from '../../../shared/contracts/results.ts'
import type { ClubContext, Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { gatherResults } from './gather-results.ts'
import { meansOf } from './means.ts'
import { rebuildSpreads } from './spreads.ts'
import {
  athleteName,
  athletesEverPinned,
  findResults,
  type FoundResult,
  lockPlace,
  pinnedTrials,
  type Place,
  redateResults,
  replaceResults,
  sessionDateOf,
  workingTrials,
} from './results.queries.ts'

/**
 * Rebuilds what the sheet says of these athletes of a session. Called in the transaction of whatever changed a
 * trial; places are locked in one order, so that two changes at once wait for each other and never lock up.
 */
export async function rebuildWorking(
  tx: Tx,
  ctx: ClubContext,
  sessionId: string,
  athleteIds: readonly (string | null)[],
): Promise<void> {
  const sessionDate = await sessionDateOf(tx, ctx.clubId, sessionId)
  const concerned = [...new Set(athleteIds.filter((athleteId) => athleteId !== null))].sort()
  for (const athleteId of concerned) {
    const place: Place = { clubId: ctx.clubId, sessionId, athleteId }
    await lockPlace(tx, place)
    const results = gatherResults(await workingTrials(tx, place))
    await replaceResults(tx, { ...place, edition: 'working', sessionDate }, results)
  }
  await rebuildSpreads(tx, { clubId: ctx.clubId, sessionId, edition: 'working' })
}

/** Rebuilds what athletes read of a session, after its pins have changed. */
export async function rebuildPublished(tx: Tx, ctx: ClubContext, sessionId: string): Promise<void> {
  const sessionDate = await sessionDateOf(tx, ctx.clubId, sessionId)
  for (const athleteId of (await athletesEverPinned(tx, ctx.clubId, sessionId)).sort()) {
    const place: Place = { clubId: ctx.clubId, sessionId, athleteId }
    await lockPlace(tx, place)
    const results = gatherResults(await pinnedTrials(tx, place))
    await replaceResults(tx, { ...place, edition: 'published', sessionDate }, results)
  }
  await rebuildSpreads(tx, { clubId: ctx.clubId, sessionId, edition: 'published' })
}

/** A session moved to another day takes its results along. */
export const redate = (tx: Tx, ctx: ClubContext, sessionId: string, sessionDate: string): Promise<void> =>
  redateResults(tx, { clubId: ctx.clubId, sessionId, sessionDate })

/** The athlete's points of the sheets as they stand, oldest first. */
export async function pointsOfAthlete(tx: Tx, ctx: ClubContext, athleteId: string): Promise<ResultPoint[]> {
  const found = await findResults(tx, { clubId: ctx.clubId, edition: 'working', athleteId })
  return found.map(pointOf)
}

/** The athlete's own page: what was published, and nothing of anyone else. */
export async function myResults(deps: Deps, ctx: Caller) {
  const { clubId, athleteId } = ctx
  if (!athleteId) return { athlete: null, results: [] }
  return deps.db.inClub(ctx, async (tx) => {
    const found = await findResults(tx, { clubId, edition: 'published', athleteId })
    return {
      athlete: { id: athleteId, name: await athleteName(tx, clubId, athleteId) },
      results: found.map(pointOf),
    }
  })
}

/** Means of a session's athletes as the sheet shows them. */
export async function meansOfSession(
  tx: Tx,
  ctx: ClubContext,
  sessionId: string,
): Promise<Map<string, Record<string, MeanFigure>>> {
  const found = await findResults(tx, { clubId: ctx.clubId, edition: 'working', sessionId })
  const means = new Map<string, Record<string, MeanFigure>>()
  // Part of the key of a result is its test; a sheet's row shows the first.
  for (const { result, spreads } of found) {
    if (!means.has(result.athleteId)) means.set(result.athleteId, meansOf(result, spreads ?? {}))
  }
  return means
}

function pointOf({ result, spreads, sessionTitle }: FoundResult): ResultPoint {
  const { protocol, side, externalLoadKg, boxHeightM, arms } = result
  return {
    sessionId: result.sessionId,
    date: result.sessionDate,
    sessionTitle,
    test: { protocol, side, externalLoadKg, boxHeightM, arms } as ResultPoint['test'],
    trialIds: result.trialIds,
    means: meansOf(result, spreads ?? {}),
  }
}
