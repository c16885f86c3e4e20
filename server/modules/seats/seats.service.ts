import { limits } from '../../../shared/contracts/limits.ts'
import type { Tx } from '../../db/database.ts'
import {
  countTaken,
  dropWait,
  findPaid,
  findRule,
  findSeatOf,
  hasTrials,
  insertSeat,
  lockSeats,
  putWait,
  selectTaken,
  selectWaits,
  setReleased,
} from './seats.queries.ts'

const dayMs = 24 * 3600 * 1000

/**
 * Gives an athlete a seat, or the next place on the waiting list where none is free. Their own seat that still
 * cools is theirs again at once.
 */
export async function takeSeat(tx: Tx, clubId: string, athleteId: string, now: Date): Promise<void> {
  await lockSeats(tx, clubId)
  const own = await findSeatOf(tx, clubId, athleteId, now)
  if (own) {
    if (own.releasedAt) await setReleased(tx, clubId, own.id, null)
    return
  }
  await putWait(tx, clubId, athleteId, now)
  await fill(tx, clubId, now)
}

/** The same, where the club wishes that seats are given by themselves. */
export async function takeSeatByItself(tx: Tx, clubId: string, athleteId: string, now: Date): Promise<void> {
  if ((await findRule(tx, clubId)).byItself) await takeSeat(tx, clubId, athleteId, now)
}

/**
 * Takes an athlete's seat, or their place on the waiting list. The seat of somebody who was measured cools until it
 * has been theirs for some days, so that one seat does not serve a whole squad in turn; that of an athlete who was
 * entered by mistake is free at once.
 */
export async function freeSeat(tx: Tx, clubId: string, athleteId: string, now: Date): Promise<void> {
  await lockSeats(tx, clubId)
  await dropWait(tx, clubId, athleteId)
  const own = await findSeatOf(tx, clubId, athleteId, now)
  if (!own || own.releasedAt) return
  const used = await hasTrials(tx, clubId, athleteId)
  const cooled = own.assignedAt.getTime() + limits.seatCoolingDays * dayMs
  const freesAt = used ? new Date(Math.max(now.getTime(), cooled)) : now
  await setReleased(tx, clubId, own.id, { releasedAt: now, freesAt })
  await fill(tx, clubId, now)
}

/** Gives what is free to who waits longest: after a purchase, and every night as seats have cooled. */
export async function fillSeats(tx: Tx, clubId: string, now: Date): Promise<void> {
  await lockSeats(tx, clubId)
  await fill(tx, clubId, now)
}

async function fill(tx: Tx, clubId: string, now: Date): Promise<void> {
  const free = (await findPaid(tx, clubId)) - (await countTaken(tx, clubId, now))
  if (free <= 0) return
  for (const { athleteId } of await selectWaits(tx, clubId).limit(free)) {
    await dropWait(tx, clubId, athleteId)
    await insertSeat(tx, clubId, athleteId, now)
  }
}

/**
 * The athletes whose seat counts. Where more are taken than are paid for, as after a change to fewer, those that were
 * taken longest ago count; the others are there again as soon as there is room.
 */
export async function seatedAthletes(tx: Tx, clubId: string, now: Date): Promise<ReadonlySet<string>> {
  const counting = await selectTaken(tx, clubId, now).limit(Math.max(0, await findPaid(tx, clubId)))
  return new Set(counting.filter(({ releasedAt }) => releasedAt === null).map(({ athleteId }) => athleteId))
}
