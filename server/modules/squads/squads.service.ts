import type { BodyOf } from '../../../shared/contracts/endpoint.ts'
import type { changeSquad, createSquad, Squad } from '../../../shared/contracts/squads.ts'
import type { Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { notFound, staleVersion } from '../../http/errors.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import {
  countUpVersions,
  findSquad,
  insertSquad,
  lockSquadLists,
  replaceMembers,
  selectSquads,
  updateSquad,
} from './squads.queries.ts'

export async function listClubSquads({ db }: Pick<Deps, 'db'>, ctx: Caller): Promise<{ squads: Squad[] }> {
  return db.inClub(ctx, async (tx) => ({ squads: await selectSquads(tx, ctx.clubId) }))
}

export async function addSquad(
  { db }: Pick<Deps, 'db'>,
  ctx: Caller,
  { name, athleteIds }: BodyOf<typeof createSquad>,
): Promise<Squad> {
  return db.inClub(ctx, async (tx) => {
    await lockSquadLists(tx, ctx.clubId)
    const id = await insertSquad(tx, ctx.clubId, name)
    await setAthletes(tx, ctx.clubId, id, athleteIds)
    return finish(tx, ctx, 'squad.create', id)
  })
}

export async function editSquad(
  { db, clock }: Pick<Deps, 'db' | 'clock'>,
  ctx: Caller,
  id: string,
  { version, name, athleteIds, archived }: BodyOf<typeof changeSquad>,
): Promise<Squad> {
  return db.inClub(ctx, async (tx) => {
    await lockSquadLists(tx, ctx.clubId)
    const archivedAt = archived === undefined ? undefined : archived ? clock() : null
    if (!(await updateSquad(tx, ctx.clubId, id, version, { name, archivedAt }))) {
      const present = await findSquad(tx, ctx.clubId, id)
      throw present ? staleVersion(present) : notFound('This squad')
    }
    if (athleteIds) await setAthletes(tx, ctx.clubId, id, athleteIds)
    return finish(tx, ctx, 'squad.change', id)
  })
}

/** For transactions that go on to `setSquadsOfAthlete`. */
export { lockSquadLists }

/** Makes `squadIds` the squads of an athlete; the squads' own versions count up. */
export async function setSquadsOfAthlete(
  tx: Tx,
  clubId: string,
  athleteId: string,
  squadIds: readonly string[],
): Promise<void> {
  const changed = await replaceMembers(tx, clubId, 'athlete', athleteId, squadIds)
  await countUpVersions(tx, clubId, 'squad', changed)
}

async function setAthletes(tx: Tx, clubId: string, squadId: string, athleteIds: readonly string[]) {
  const changed = await replaceMembers(tx, clubId, 'squad', squadId, athleteIds)
  await countUpVersions(tx, clubId, 'athlete', changed)
}

async function finish(tx: Tx, ctx: Caller, action: string, id: string): Promise<Squad> {
  await record(tx, ctx, action, 'squad', id)
  await notify(tx, ctx.clubId, { kind: 'athletes', id: null })
  const squad = await findSquad(tx, ctx.clubId, id)
  if (!squad) throw notFound('This squad')
  return squad
}
