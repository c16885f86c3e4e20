import type { SeatLine, SeatPlan } from '../../../shared/contracts/seats.ts'
import type { Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { notFound, staleVersion } from '../../http/errors.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import {
  findPaid,
  findRule,
  lockSeats,
  putRule,
  selectActive,
  selectTaken,
  selectWaits,
} from './seats.queries.ts'
import { freeSeat, takeSeat } from './seats.service.ts'

type SeatDeps = Pick<Deps, 'db' | 'clock'>

/** Who holds a seat, who waits for one, and what is free. */
export const readSeatPlan = ({ db, clock }: SeatDeps, ctx: Caller): Promise<SeatPlan> =>
  db.inClub(ctx, (tx) => planOf(tx, ctx.clubId, clock()))

export const give = (deps: SeatDeps, ctx: Caller, athleteId: string): Promise<SeatPlan> =>
  change(deps, ctx, athleteId, 'seat.give', takeSeat)

export const release = (deps: SeatDeps, ctx: Caller, athleteId: string): Promise<SeatPlan> =>
  change(deps, ctx, athleteId, 'seat.release', freeSeat)

async function change(
  { db, clock }: SeatDeps,
  ctx: Caller,
  athleteId: string,
  action: string,
  act: typeof takeSeat,
): Promise<SeatPlan> {
  const { clubId } = ctx
  return db.inClub(ctx, async (tx) => {
    await requireActive(tx, clubId, athleteId)
    await act(tx, clubId, athleteId, clock())
    await record(tx, ctx, action, 'athlete', athleteId)
    await notify(tx, clubId, { kind: 'athletes', id: athleteId })
    return planOf(tx, clubId, clock())
  })
}

/** Sets whether seats are given by themselves from now on; nobody's seat changes by it. */
export async function setRule(
  { db, clock }: SeatDeps,
  ctx: Caller,
  { byItself, version }: { byItself: boolean; version: number },
): Promise<SeatPlan> {
  const { clubId } = ctx
  return db.inClub(ctx, async (tx) => {
    await lockSeats(tx, clubId)
    if (!(await putRule(tx, clubId, byItself, version))) throw staleVersion(await planOf(tx, clubId, clock()))
    await record(tx, ctx, 'seat.rule', 'club', clubId, { byItself })
    return planOf(tx, clubId, clock())
  })
}

async function requireActive(tx: Tx, clubId: string, athleteId: string): Promise<void> {
  const active = await selectActive(tx, clubId)
  if (!active.some(({ id }) => id === athleteId)) throw notFound('This athlete')
}

async function planOf(tx: Tx, clubId: string, now: Date): Promise<SeatPlan> {
  const paid = await findPaid(tx, clubId)
  const taken = await selectTaken(tx, clubId, now)
  const waits = new Map((await selectWaits(tx, clubId)).map(({ athleteId, since }) => [athleteId, since]))
  const lines = new Map<string, SeatLine>()
  for (const { id, name } of await selectActive(tx, clubId)) {
    const since = waits.get(id)?.toISOString() ?? null
    lines.set(id, { athleteId: id, name, state: since ? 'waiting' : 'none', since, freesAt: null })
  }
  taken.forEach(({ athleteId, name, assignedAt, releasedAt, freesAt }, place) => {
    const state = releasedAt ? 'cooling' : place < paid ? 'seated' : 'over'
    const since = assignedAt.toISOString()
    lines.set(athleteId, { athleteId, name, state, since, freesAt: freesAt?.toISOString() ?? null })
  })
  const rule = await findRule(tx, clubId)
  return { paid, used: taken.length, ...rule, athletes: [...lines.values()] }
}
