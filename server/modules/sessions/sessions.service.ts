import type { z } from 'zod'
import type {
  changeSession,
  listSessions,
  SessionForm,
  SessionSummary,
} from '../../../shared/contracts/sessions.ts'
import type { Test } from '../../../shared/contracts/tests.ts'
import type { BodyOf, QueryOf, ResponseOf } from '../../../shared/contracts/endpoint.ts'
import type { ClubContext, Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { notFound, staleVersion } from '../../http/errors.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import { redate } from '../results/results.service.ts'
import type { Candidate } from '../trials/match-athlete.ts'
import { retest } from '../trials/retest.service.ts'
import { squadMissing } from './sessions.errors.ts'
import {
  addSquads,
  athletesOfSession,
  countSquads,
  lockSession,
  removeSquads,
  squadIdsOfSession,
} from './session-squads.queries.ts'
import {
  countSessions,
  findSession,
  findSummaries,
  findSummary,
  insertSession,
  type SessionRow,
  updateSession,
} from './sessions.queries.ts'

const pageSize = 20

export async function list(
  deps: Deps,
  ctx: Caller,
  { page, ...wanted }: QueryOf<typeof listSessions>,
): Promise<ResponseOf<typeof listSessions>> {
  const filter = { clubId: ctx.clubId, ...wanted }
  return deps.db.inClub(ctx, async (tx) => {
    const total = await countSessions(tx, filter)
    const sessions = await findSummaries(tx, filter, { offset: (page - 1) * pageSize, limit: pageSize })
    return { sessions, page, pages: Math.max(1, Math.ceil(total / pageSize)), total }
  })
}

/** Makes a session with every athlete that its squads have today. */
export async function create(
  deps: Deps,
  ctx: Caller,
  { squadIds, ...form }: z.output<typeof SessionForm>,
): Promise<SessionSummary> {
  const chosen = [...new Set(squadIds)]
  return deps.db.inClub(ctx, async (tx) => {
    await requireSquads(tx, ctx.clubId, chosen)
    const sessionId = await insertSession(tx, { ...form, clubId: ctx.clubId, createdBy: ctx.personId })
    await addSquads(tx, ctx.clubId, sessionId, chosen)
    await record(tx, ctx, 'session.create', 'session', sessionId)
    return requireSummary(tx, ctx, sessionId)
  })
}

export async function change(
  deps: Deps,
  ctx: Caller,
  sessionId: string,
  { version, squadIds, ...form }: BodyOf<typeof changeSession>,
): Promise<SessionSummary> {
  return deps.db.inClub(ctx, async (tx) => {
    if (squadIds || form.test) await lockSession(tx, ctx.clubId, sessionId, 'alone')
    const before = await findSummary(tx, ctx.clubId, sessionId)
    const changed = await updateSession(tx, { clubId: ctx.clubId, sessionId, version }, form)
    if (!changed) throw staleVersion(await requireSummary(tx, ctx, sessionId))
    if (before && form.test) await retest(tx, ctx, sessionId, { from: before.test, to: form.test })
    if (squadIds) await changeSquads(tx, ctx.clubId, sessionId, squadIds)
    const session = await requireSummary(tx, ctx, sessionId)
    if (form.date) await redate(tx, ctx, sessionId, form.date)
    await record(tx, ctx, 'session.change', 'session', sessionId)
    await notify(
      tx,
      ctx.clubId,
      { kind: 'session', id: sessionId },
      session.publishedAt ? 'everybody' : 'staff',
    )
    return session
  })
}

/** Squads that stay are left as they are: their athletes are those of the day they came. */
async function changeSquads(tx: Tx, clubId: string, sessionId: string, wanted: string[]): Promise<void> {
  const there = await squadIdsOfSession(tx, clubId, sessionId)
  const coming = [...new Set(wanted)].filter((id) => !there.includes(id))
  await requireSquads(tx, clubId, coming)
  await addSquads(tx, clubId, sessionId, coming)
  const going = there.filter((id) => !wanted.includes(id))
  await removeSquads(tx, clubId, sessionId, going)
}

async function requireSquads(tx: Tx, clubId: string, squadIds: string[]): Promise<void> {
  if ((await countSquads(tx, clubId, squadIds)) !== squadIds.length) throw squadMissing()
}

export async function requireSummary(tx: Tx, ctx: ClubContext, sessionId: string): Promise<SessionSummary> {
  const session = await findSummary(tx, ctx.clubId, sessionId)
  if (!session) throw notFound('This session')
  return session
}

export async function requireSession(tx: Tx, ctx: ClubContext, sessionId: string): Promise<SessionRow> {
  const session = await findSession(tx, ctx.clubId, sessionId)
  if (!session) throw notFound('This session')
  return session
}

/** What a recording of the session is read as, and whom it may be of: they stay until the transaction ends. */
export async function candidatesOf(
  tx: Tx,
  clubId: string,
  sessionId: string,
): Promise<{ test: Test; candidates: Candidate[] }> {
  await lockSession(tx, clubId, sessionId, 'share')
  const session = await findSummary(tx, clubId, sessionId)
  if (!session) throw new Error('The session of an upload is gone.')
  return { test: session.test, candidates: await athletesOfSession(tx, clubId, sessionId) }
}
