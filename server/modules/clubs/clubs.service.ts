import type { ClubSettings } from '../../../shared/contracts/clubs.ts'
import { enterClub, workerContext } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { notFound, staleVersion } from '../../http/errors.ts'
import { record } from '../audit/audit.service.ts'
import { notify } from '../events/notify.ts'
import { countSeats, findSettings, insertClub, insertSettings, updateSettings } from './clubs.queries.ts'

export async function readSettings({ db }: Pick<Deps, 'db'>, ctx: Caller): Promise<ClubSettings> {
  const settings = await db.inClub(ctx, (tx) => findSettings(tx, ctx.clubId))
  if (!settings) throw notFound('The club')
  return settings
}

export async function editSettings(
  { db }: Pick<Deps, 'db'>,
  ctx: Caller,
  next: ClubSettings,
): Promise<ClubSettings> {
  return db.inClub(ctx, async (tx) => {
    const changed = await updateSettings(tx, ctx.clubId, next)
    if (!changed) throw staleVersion(await findSettings(tx, ctx.clubId))
    const { landingPeakLimits } = changed
    await record(tx, ctx, 'club.settings', 'club', ctx.clubId, { landingPeakLimits })
    await notify(tx, ctx.clubId, { kind: 'athletes', id: null })
    return changed
  })
}

/** Seats in use (active athletes), seats paid for, and staff, who need none. */
export const readSeats = ({ db }: Pick<Deps, 'db'>, ctx: Caller) =>
  db.inClub(ctx, (tx) => countSeats(tx, ctx.clubId))

export interface NewClub {
  name: string
  /** IANA name. */
  timeZone: string
  seats: number
  demo: boolean
}

/** Makes a club without people, with its settings. */
export async function createClub({ db }: Pick<Deps, 'db'>, { seats, demo, ...club }: NewClub) {
  return db.inIdentity(async (tx) => {
    const clubId = await insertClub(tx, club)
    await enterClub(tx, workerContext(clubId))
    await insertSettings(tx, { clubId, seats, demo })
    return clubId
  })
}
