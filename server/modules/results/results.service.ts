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
  datesOfSessions,
  type Edition,
  findResults,
  type FoundResult,
  lockPlaces,
  pinnedTrials,
  type Place,
  redateResults,
  replaceResults,
  workingTrials,
} from './results.queries.ts'

/** Rebuilds what the sheet says of these athletes of a session. Called in the transaction of whatever changed a trial. */
export function rebuildWorking(
  tx: Tx,
  ctx: ClubContext,
  sessionId: string,
  athleteIds: readonly (string | null)[],
): Promise<void> {
  const places = placesOf(sessionId, athleteIds)
  return rebuild(tx, ctx.clubId, 'working', { places, sessionIds: [sessionId] })
}

/** The same for the trials of several sessions at once, in as many statements as for one. */
export function rebuildWorkingOf(
  tx: Tx,
  ctx: ClubContext,
  trials: readonly { sessionId: string; athleteId: string | null }[],
): Promise<void> {
  const sessionIds = [...new Set(trials.map(({ sessionId }) => sessionId))]
  const places = sessionIds.flatMap((sessionId) =>
    placesOf(
      sessionId,
      trials.filter((trial) => trial.sessionId === sessionId).map(({ athleteId }) => athleteId),
    ),
  )
  return rebuild(tx, ctx.clubId, 'working', { places, sessionIds })
}

/** Rebuilds what athletes read of a session, after its pins have changed. */
export async function rebuildPublished(tx: Tx, ctx: ClubContext, sessionId: string): Promise<void> {
  const places = placesOf(sessionId, await athletesEverPinned(tx, ctx.clubId, sessionId))
  await rebuild(tx, ctx.clubId, 'published', { places, sessionIds: [sessionId] })
}

const placesOf = (sessionId: string, athleteIds: readonly (string | null)[]): Place[] =>
  [...new Set(athleteIds)].flatMap((athleteId) => (athleteId === null ? [] : [{ sessionId, athleteId }]))

async function rebuild(
  tx: Tx,
  clubId: string,
  edition: Edition,
  { places, sessionIds }: { places: Place[]; sessionIds: string[] },
): Promise<void> {
  if (places.length > 0) {
    await lockPlaces(tx, clubId, places)
    const dates = await datesOfSessions(tx, clubId, sessionIds)
    const trialsOf = edition === 'working' ? workingTrials : pinnedTrials
    const trials = await trialsOf(tx, clubId, places)
    const results = places.flatMap((place) =>
      gatherResults(trials.filter((trial) => isAt(trial, place))).map((result) => ({
        ...place,
        ...result,
        sessionDate: dates.get(place.sessionId) ?? '',
      })),
    )
    await replaceResults(tx, { clubId, edition, places }, results)
  }
  await rebuildSpreads(tx, { clubId, edition, sessionIds })
}

const isAt = (trial: Place, { sessionId, athleteId }: Place) =>
  trial.sessionId === sessionId && trial.athleteId === athleteId

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
