import { promisify } from 'node:util'
import { inflate } from 'node:zlib'
import type { BodyOf } from '../../../shared/contracts/endpoint.ts'
import type { SheetTrial } from '../../../shared/contracts/sessions.ts'
import { measuringRoles, type Role } from '../../../shared/contracts/roles.ts'
import type { changeTrial, Trial } from '../../../shared/contracts/trials.ts'
import { decodeSamples } from '../../../shared/recordings/samples-codec.ts'
import type { Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { notFound, staleVersion } from '../../http/errors.ts'
import { sendJobs } from '../../jobs/queue.ts'
import { viewAnalysis } from '../analyses/analyses.service.ts'
import { viewEngineInputs } from '../analyses/engine-inputs.service.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import { rebuildWorking } from '../results/results.service.ts'
import { seatedAthletes } from '../seats/seats.service.ts'
import { candidatesOf } from '../sessions/sessions.service.ts'
import { mayMoveEvents } from './may-move-events.ts'
import { findEventMoves } from './moved-events.queries.ts'
import { setAsideOf, toSheetTrial } from './sheet-trials.ts'
import { athleteNotInSession, athleteUnseated } from './trials.errors.ts'
import {
  findOwnTrial,
  findSamples,
  findTrial,
  type Neighbour,
  ownOrderOf,
  sheetOrderOf,
  sheetTrials,
  type TrialChange,
  type TrialPageRow,
  updateTrial,
} from './trials.queries.ts'

const inflated = promisify(inflate)
export const missing = () => notFound('This trial')

/** Coach and physio see every trial; anybody else only their own, as it was published. */
const measures = (ctx: Caller) => ctx.roles.some((role) => (measuringRoles as readonly Role[]).includes(role))

export function getTrial(deps: Deps, ctx: Caller, trialId: string): Promise<Trial> {
  return deps.db.inClub(ctx, (tx) =>
    measures(ctx) ? staffTrial(tx, ctx, trialId) : ownTrial(tx, ctx, trialId),
  )
}

/** The trial as staff read it. */
export async function staffTrial(tx: Tx, ctx: Caller, trialId: string): Promise<Trial> {
  const row = await findTrial(tx, ctx.clubId, trialId)
  if (!row) throw missing()
  const order = await sheetOrderOf(tx, ctx.clubId, row.sessionId)
  const analysis = await viewAnalysis(tx, ctx.clubId, { trialId })
  return {
    ...pageOf(row, order),
    setAside: setAsideOf(row),
    analysis,
    mayEdit: true,
    eventMoves: await findEventMoves(tx, ctx.clubId, trialId),
    engineInputs: mayMoveEvents(ctx, row) ? await viewEngineInputs(tx, ctx.clubId, trialId) : null,
  }
}

/** Set aside later, or moved: what was published stands until it is published anew. */
async function ownTrial(tx: Tx, { clubId, athleteId }: Caller, trialId: string): Promise<Trial> {
  const row = athleteId && (await findOwnTrial(tx, clubId, athleteId, trialId))
  if (!row) throw missing()
  const order = await ownOrderOf(tx, clubId, athleteId, row.sessionId)
  const analysis = await viewAnalysis(tx, clubId, { analysisId: row.analysisId })
  const page = pageOf({ ...row, athleteId }, order)
  return { ...page, setAside: null, analysis, mayEdit: false, eventMoves: [], engineInputs: null }
}

type PageRow = Omit<TrialPageRow, 'fileName' | 'setAsideByName'> & { fileName: string | null }

function pageOf(row: PageRow, order: Neighbour[]) {
  const { id, sessionId, sessionTitle, sessionDate, place, uploadId, fileName, test, recording, version } =
    row
  const at = order.findIndex((trial) => trial.id === id)
  const ofAthlete = order.filter(({ athleteId }) => athleteId === row.athleteId)
  return {
    id,
    sessionId,
    sessionTitle,
    sessionDate,
    place,
    uploadId,
    fileName,
    athlete: row.athleteId && row.athleteName ? { id: row.athleteId, name: row.athleteName } : null,
    placeInSession: row.athleteId
      ? { n: ofAthlete.findIndex((trial) => trial.id === id) + 1, of: ofAthlete.length }
      : null,
    test,
    recording,
    previousTrialId: order[at - 1]?.id ?? null,
    nextTrialId: order[at + 1]?.id ?? null,
    version,
  }
}

/** Little-endian int32 millinewtons, channel after channel: the very numbers that were analysed. */
export async function getSamples(deps: Deps, ctx: Caller, trialId: string): Promise<Buffer> {
  const stored = await deps.db.inClub(ctx, async (tx) => {
    const { clubId, athleteId } = ctx
    const may = measures(ctx) || (athleteId && (await findOwnTrial(tx, clubId, athleteId, trialId)))
    return may ? findSamples(tx, clubId, trialId) : null
  })
  if (!stored) throw missing()
  const { channels } = decodeSamples(await inflated(stored.bytes))
  const forces = [channels.left, channels.right, channels.single, channels.total].filter(
    (force) => force !== undefined,
  )
  const bytes = Buffer.alloc(4 * forces.reduce((length, force) => length + force.length, 0))
  let at = 0
  for (const force of forces) {
    for (const newtons of force) at = bytes.writeInt32LE(Math.round(newtons * 1000), at)
  }
  return bytes
}

/** Puts a trial on an athlete of the session or back in the Tray, sets it aside with a reason, or takes it back. */
export function change(
  deps: Deps,
  ctx: Caller,
  trialId: string,
  body: BodyOf<typeof changeTrial>,
): Promise<Trial> {
  const { clubId } = ctx
  return deps.db.inClub(ctx, async (tx) => {
    const before = await findTrial(tx, clubId, trialId)
    if (!before) throw missing()
    if (body.athleteId) await requireInSession(tx, clubId, before.sessionId, body.athleteId)
    if (body.athleteId && body.athleteId !== before.athleteId) {
      const seated = await seatedAthletes(tx, clubId, deps.clock())
      if (!seated.has(body.athleteId)) throw athleteUnseated()
    }
    const changed = await updateTrial(
      tx,
      { clubId, trialId, version: body.version },
      changeOf(deps, ctx, body),
    )
    if (!changed) throw staleVersion(await staffTrial(tx, ctx, trialId))
    await noteChange(tx, ctx, before, body)
    const moved = body.athleteId !== undefined && body.athleteId !== before.athleteId
    // The athlete's recorded mass is part of what a trial is checked against.
    if (moved) await sendJobs(tx, 'analyse-trial', { version: 1, clubId, trialId })
    await rebuildWorking(tx, ctx, before.sessionId, [before.athleteId, body.athleteId ?? null])
    await notify(tx, clubId, { kind: 'session', id: before.sessionId })
    return staffTrial(tx, ctx, trialId)
  })
}

function changeOf(
  deps: Deps,
  ctx: Caller,
  { athleteId, setAsideReason }: BodyOf<typeof changeTrial>,
): TrialChange {
  const assignment: TrialChange =
    athleteId === undefined ? {} : { athleteId, assignedBy: athleteId === null ? null : 'hand' }
  if (setAsideReason === undefined) return assignment
  return setAsideReason === null
    ? { ...assignment, setAsideReason: null, setAsideBy: null, setAsideAt: null }
    : { ...assignment, setAsideReason, setAsideBy: ctx.personId, setAsideAt: deps.clock() }
}

async function noteChange(
  tx: Tx,
  ctx: Caller,
  before: TrialPageRow,
  body: BodyOf<typeof changeTrial>,
): Promise<void> {
  if (body.athleteId !== undefined) {
    const detail = { from: before.athleteId, to: body.athleteId }
    await record(tx, ctx, 'trial.assign', 'trial', before.id, detail)
  }
  if (body.setAsideReason !== undefined) {
    const action = body.setAsideReason === null ? 'trial.take-back' : 'trial.set-aside'
    await record(tx, ctx, action, 'trial', before.id)
  }
}

async function requireInSession(tx: Tx, clubId: string, sessionId: string, athleteId: string): Promise<void> {
  const { candidates } = await candidatesOf(tx, clubId, sessionId)
  if (!candidates.some(({ id }) => id === athleteId)) throw athleteNotInSession()
}

/** The trials of a session's sheet: athletes by name, the Tray last. */
export async function trialsOfSession(tx: Tx, clubId: string, sessionId: string): Promise<SheetTrial[]> {
  return (await sheetTrials(tx, clubId, sessionId)).map(toSheetTrial)
}
