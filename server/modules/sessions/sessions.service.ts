import type { z } from 'zod'
import type {
  changeSession,
  listSessions,
  SessionForm,
  SessionSummary,
} from '../../../shared/contracts/sessions.ts'
import type { BodyOf, QueryOf, ResponseOf } from '../../../shared/contracts/endpoint.ts'
import type { ClubContext, Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { notFound, staleVersion } from '../../http/errors.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import { redate } from '../results/results.service.ts'
import type { Candidate } from '../trials/match-athlete.ts'
import { squadMissing } from './sessions.errors.ts'
import {
  athletesOfSession,
  countSessions,
  countSquads,
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
    if ((await countSquads(tx, ctx.clubId, chosen)) !== chosen.length) throw squadMissing()
    const session = { ...form, clubId: ctx.clubId, createdBy: ctx.personId }
    const sessionId = await insertSession(tx, session, chosen)
    await record(tx, ctx, 'session.create', 'session', sessionId)
    return requireSummary(tx, ctx, sessionId)
  })
}

export async function change(
  deps: Deps,
  ctx: Caller,
  sessionId: string,
  { version, ...form }: BodyOf<typeof changeSession>,
): Promise<SessionSummary> {
  return deps.db.inClub(ctx, async (tx) => {
    const changed = await updateSession(tx, { clubId: ctx.clubId, sessionId, version }, form)
    const session = await requireSummary(tx, ctx, sessionId)
    if (!changed) throw staleVersion(session)
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

/** What a recording of the session is read as, and whom its file name may name. */
export async function candidatesOf(
  tx: Tx,
  clubId: string,
  sessionId: string,
): Promise<{ protocol: string; candidates: Candidate[] }> {
  const session = await findSession(tx, clubId, sessionId)
  if (!session) throw new Error('The session of an upload is gone.')
  return { protocol: session.protocol, candidates: await athletesOfSession(tx, clubId, sessionId) }
}
