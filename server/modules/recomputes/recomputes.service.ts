import type { BodyOf, QueryOf, ResponseOf } from '../../../shared/contracts/endpoint.ts'
import type {
  getRecompute,
  getStanding,
  listRecomputes,
  Recompute,
  Scope,
  startRecompute,
} from '../../../shared/contracts/recomputes.ts'
import { engineVersion } from '../../../shared/mechanics/version.ts'
import { named } from '../../db/constraint-errors.ts'
import type { Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { notFound } from '../../http/errors.ts'
import { sendJobs } from '../../jobs/queue.ts'
import { standingOf, trialsMadeOtherwise } from '../analyses/remake.service.ts'
import { record } from '../audit/audit.service.ts'
import { madeWithNow } from '../clubs/measuring.service.ts'
import { notify } from '../events/notify.ts'
import { cutBatches } from './cut-batches.ts'
import { nothingToRecompute, recomputeRunning } from './recomputes.errors.ts'
import {
  endRecompute,
  findMoves,
  findOpen,
  findRecompute,
  insertRecompute,
  isThere,
  listOf,
  type RecomputeRow,
} from './recomputes.queries.ts'
import { reportOf } from './report.ts'

type ScopeIds = QueryOf<typeof getStanding>

/** How many analyses were made otherwise than they would be now, and what is done about it at the moment. */
export function readStanding(
  { db }: Pick<Deps, 'db'>,
  ctx: Caller,
  scope: ScopeIds,
): Promise<ResponseOf<typeof getStanding>> {
  return db.inClub(ctx, async (tx) => {
    await requireScope(tx, ctx.clubId, scope)
    const open = await findOpen(tx, ctx.clubId)
    const standing = await standingOf(tx, ctx.clubId, scope, await madeWithNow(tx, ctx.clubId))
    return { engineVersion, ...standing, open: open && toView(open) }
  })
}

export function listRecent(
  { db }: Pick<Deps, 'db'>,
  ctx: Caller,
  scope: ScopeIds,
): Promise<ResponseOf<typeof listRecomputes>> {
  return db.inClub(ctx, async (tx) => {
    await requireScope(tx, ctx.clubId, scope)
    return { recomputes: (await listOf(tx, ctx.clubId, scope)).map(toView) }
  })
}

export function readRecompute(
  { db }: Pick<Deps, 'db'>,
  ctx: Caller,
  id: string,
): Promise<ResponseOf<typeof getRecompute>> {
  return db.inClub(ctx, async (tx) => {
    const recompute = await requireRecompute(tx, ctx.clubId, id)
    const moves = await findMoves(tx, ctx.clubId, id)
    return { recompute, report: moves && (await reportOf(tx, ctx.clubId, moves)) }
  })
}

/**
 * Asks for the scope's analyses to be made again with what is in force now, in jobs. What is in force later does not
 * change what was asked for: settings and plates are refused a change meanwhile.
 */
export function start(
  { db }: Pick<Deps, 'db'>,
  ctx: Caller,
  { scope, dryRun }: BodyOf<typeof startRecompute>,
): Promise<Recompute> {
  const { clubId, personId: requestedBy } = ctx
  return db.inClub(ctx, async (tx) => {
    const ids = idsOf(scope)
    await requireScope(tx, clubId, ids)
    await refuseWhileRunning(tx, clubId)
    const madeWith = await madeWithNow(tx, clubId)
    const trials = await trialsMadeOtherwise(tx, clubId, ids, madeWith)
    if (trials.length === 0) throw nothingToRecompute()
    const row = { clubId, scope: scope.kind, ...ids, dryRun, engineVersion, madeWith, requestedBy }
    const batches = cutBatches(trials)
    const id = await named(
      { recomputes_open: recomputeRunning },
      insertRecompute(tx, { ...row, total: trials.length }, batches),
    )
    const jobs = batches.map((_, n) => ({ version: 1 as const, clubId, recomputeId: id, n }))
    await sendJobs(tx, 'recompute-batch', ...jobs)
    await record(tx, ctx, 'recompute.start', 'recompute', id, { ...scope, dryRun, trials: trials.length })
    await notify(tx, clubId, { kind: 'recomputes', id })
    return requireRecompute(tx, clubId, id)
  })
}

/** Lets no more of its jobs begin. What was made already stays; one that has ended stays as it ended. */
export function cancel(
  { db, clock }: Pick<Deps, 'db' | 'clock'>,
  ctx: Caller,
  id: string,
): Promise<Recompute> {
  const { clubId } = ctx
  return db.inClub(ctx, async (tx) => {
    await requireRecompute(tx, clubId, id)
    if (await endRecompute(tx, clubId, id, { state: 'cancelled', finishedAt: clock() })) {
      await sendJobs(tx, 'add-up-moves', { version: 1, clubId, recomputeId: id })
      await record(tx, ctx, 'recompute.cancel', 'recompute', id)
      await notify(tx, clubId, { kind: 'recomputes', id })
    }
    return requireRecompute(tx, clubId, id)
  })
}

/** What analyses are made with holds still while they are made again. */
export async function refuseWhileRunning(tx: Tx, clubId: string): Promise<void> {
  if (await findOpen(tx, clubId)) throw recomputeRunning()
}

async function requireRecompute(tx: Tx, clubId: string, id: string): Promise<Recompute> {
  const row = await findRecompute(tx, clubId, id)
  if (!row) throw notFound('This recompute')
  return toView(row)
}

async function requireScope(tx: Tx, clubId: string, { sessionId, athleteId }: ScopeIds): Promise<void> {
  if (sessionId && !(await isThere(tx, clubId, { sessionId }))) throw notFound('This session')
  if (athleteId && !(await isThere(tx, clubId, { athleteId }))) throw notFound('This athlete')
}

function idsOf(scope: Scope): ScopeIds {
  if (scope.kind === 'session') return { sessionId: scope.sessionId }
  return scope.kind === 'athlete' ? { athleteId: scope.athleteId } : {}
}

function toView(row: RecomputeRow): Recompute {
  const { id, dryRun, total, done, sessionId, athleteId, sessionTitle, athleteName } = row
  return {
    id,
    scope: sessionId
      ? { kind: 'session', sessionId }
      : athleteId
        ? { kind: 'athlete', athleteId }
        : { kind: 'club' },
    scopeName: sessionTitle ?? athleteName,
    dryRun,
    state: row.state as Recompute['state'],
    total,
    done,
    engineVersion: row.engineVersion,
    requestedByName: row.requestedByName ?? '',
    requestedAt: row.createdAt.toISOString(),
    finishedAt: row.finishedAt?.toISOString() ?? null,
  }
}
