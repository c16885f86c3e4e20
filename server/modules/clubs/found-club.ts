import { enterClub, workerContext } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import { prepareInvitation } from '../people/invitations.service.ts'
import { insertClub, insertSettings } from './clubs.queries.ts'
import type { NewClub } from './clubs.service.ts'

/** Makes a club and an invitation for its first admin, at once; returns the invitation's link. */
export async function foundClub(
  { db, config, clock }: Pick<Deps, 'db' | 'clock'> & { config: { appUrl: string } },
  { seats, demo, ...club }: NewClub,
  admin: { name: string; email: string },
): Promise<string> {
  return db.inIdentity(async (tx) => {
    const clubId = await insertClub(tx, club)
    const token = await prepareInvitation(tx, clubId, { ...admin, roles: ['admin'] }, clock())
    await enterClub(tx, workerContext(clubId))
    await insertSettings(tx, { clubId, seats, demo })
    return `${config.appUrl}/invite/${token}`
  })
}
