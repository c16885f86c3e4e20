import { limits } from '../../../shared/contracts/limits.ts'
import { enterClub, workerContext } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import { beginTrial } from '../billing/trial.service.ts'
import { prepareInvitation } from '../people/invitations.service.ts'
import { insertClub, insertSettings } from './clubs.queries.ts'
import type { NewClub } from './clubs.service.ts'

/**
 * Makes a club and an invitation for its first admin, at once; returns the invitation's link.
 * @param club with `trial`, it has the seats of a trial and only reads when that is over and nothing was bought
 */
export async function foundClub(
  { db, config, clock }: Pick<Deps, 'db' | 'clock'> & { config: { appUrl: string } },
  { seats, demo, trial = false, ...club }: NewClub & { trial?: boolean },
  admin: { name: string; email: string },
): Promise<string> {
  return db.inIdentity(async (tx) => {
    const clubId = await insertClub(tx, club)
    const token = await prepareInvitation(tx, clubId, { ...admin, roles: ['admin'] }, clock())
    await enterClub(tx, workerContext(clubId))
    await insertSettings(tx, { clubId, seats: trial ? limits.trialSeats : seats, demo })
    if (trial) await beginTrial(tx, clubId, clock())
    return `${config.appUrl}/invite/${token}`
  })
}
