import type { Athlete, changeAthlete, createAthlete } from '../../../shared/contracts/athletes.ts'
import type { BodyOf } from '../../../shared/contracts/endpoint.ts'
import { foldName } from '../../../shared/contracts/names.ts'
import type { Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { notFound, staleVersion } from '../../http/errors.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import { pointsOfAthlete } from '../results/results.service.ts'
import { freeSeat, takeSeatByItself } from '../seats/seats.service.ts'
import { lockSquadLists, setSquadsOfAthlete } from '../squads/squads.service.ts'
import { findAthlete, insertAthlete, selectAthletes, updateAthlete } from './athletes.queries.ts'

export async function listClubAthletes(
  { db }: Pick<Deps, 'db'>,
  ctx: Caller,
): Promise<{ athletes: Athlete[] }> {
  return db.inClub(ctx, async (tx) => ({ athletes: await selectAthletes(tx, ctx.clubId) }))
}

/** An athlete with one point a session, of the sheets as they stand. */
export async function openAthlete({ db }: Pick<Deps, 'db'>, ctx: Caller, id: string) {
  return db.inClub(ctx, async (tx) => ({
    athlete: await readAthlete(tx, ctx, id),
    results: await pointsOfAthlete(tx, ctx, id),
  }))
}

export async function addAthlete(
  { db, clock }: Pick<Deps, 'db' | 'clock'>,
  ctx: Caller,
  { squadIds, ...form }: BodyOf<typeof createAthlete>,
): Promise<Athlete> {
  return db.inClub(ctx, async (tx) => {
    await lockSquadLists(tx, ctx.clubId)
    const id = await insertAthlete(tx, ctx.clubId, { ...form, nameKey: foldName(form.name) })
    await setSquadsOfAthlete(tx, ctx.clubId, id, squadIds)
    await takeSeatByItself(tx, ctx.clubId, id, clock())
    return finish(tx, ctx, 'athlete.create', id)
  })
}

export async function editAthlete(
  { db, clock }: Pick<Deps, 'db' | 'clock'>,
  ctx: Caller,
  id: string,
  { version, squadIds, archived, ...form }: BodyOf<typeof changeAthlete>,
): Promise<Athlete> {
  return db.inClub(ctx, async (tx) => {
    await lockSquadLists(tx, ctx.clubId)
    const archivedAt = archived === undefined ? undefined : archived ? clock() : null
    const nameKey = form.name === undefined ? undefined : foldName(form.name)
    if (!(await updateAthlete(tx, ctx.clubId, id, version, { ...form, nameKey, archivedAt }))) {
      const present = await findAthlete(tx, ctx.clubId, id)
      throw present ? staleVersion(present) : notFound('This athlete')
    }
    if (squadIds) await setSquadsOfAthlete(tx, ctx.clubId, id, squadIds)
    if (archived === true) await freeSeat(tx, ctx.clubId, id, clock())
    if (archived === false) await takeSeatByItself(tx, ctx.clubId, id, clock())
    return finish(tx, ctx, 'athlete.change', id)
  })
}

/** One athlete of the club; a 404 of anybody else. */
async function readAthlete(tx: Tx, ctx: Caller, id: string): Promise<Athlete> {
  const athlete = await findAthlete(tx, ctx.clubId, id)
  if (!athlete) throw notFound('This athlete')
  return athlete
}

async function finish(tx: Tx, ctx: Caller, action: string, id: string): Promise<Athlete> {
  await record(tx, ctx, action, 'athlete', id)
  await notify(tx, ctx.clubId, { kind: 'athletes', id })
  return readAthlete(tx, ctx, id)
}
