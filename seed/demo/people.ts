import type { Deps } from '../../server/deps.ts'
import type { Caller } from '../../server/http/caller.ts'
import { acceptByToken } from '../../server/modules/account/invitations.service.ts'
import { addAthlete } from '../../server/modules/athletes/athletes.service.ts'
import { editSettings, readSettings } from '../../server/modules/clubs/clubs.service.ts'
import { foundClub } from '../../server/modules/clubs/found-club.ts'
import { invite, openInvitationLink } from '../../server/modules/people/invitations.service.ts'
import { addSquad } from '../../server/modules/squads/squads.service.ts'
import { demoAccounts, type DemoAccount, demoPassword } from './accounts.ts'
import { demoSquads, type DemoSquad } from './squads.ts'
import { type Athlete, describeAthlete } from './stories.ts'

/** Peak landing force in body weights above which the demo's physio wants to look. */
const landingLimit = 4.4
const youngest = 2009

export interface SquadOnSite {
  squad: DemoSquad
  squadId: string
  coach: Caller
  athletes: Athlete[]
}

/** The invented club with its people, athletes and squads, each made as the product makes them. */
export async function makePeople(deps: Deps): Promise<SquadOnSite[]> {
  const [founder, ...others] = demoAccounts
  const club = { name: 'Saltmarsh Athletic Club', timeZone: 'Europe/London', seats: 48, demo: true }
  const link = await foundClub(deps, club, founder)
  const admin = await accept(deps, founder, link.slice(link.lastIndexOf('/') + 1))
  const { athleteIds, squads } = await makeSquads(deps, admin)
  const callers = new Map([[founder.name, admin]])
  for (const account of others) callers.set(account.name, await join(deps, admin, account, athleteIds))
  const settings = await readSettings(deps, admin)
  await editSettings(deps, admin, { ...settings, landingPeakLimits: { cmj: landingLimit } })
  return squads.map((site) => ({ ...site, coach: callers.get(site.squad.coach) ?? admin }))
}

async function makeSquads(deps: Deps, admin: Caller) {
  const athleteIds = new Map<string, string>()
  const squads: Omit<SquadOnSite, 'coach'>[] = []
  let seed = 0
  for (const squad of demoSquads) {
    const { id: squadId } = await addSquad(deps, admin, { name: squad.name, athleteIds: [] })
    const athletes = squad.athletes.map((name) => describeAthlete(name, (seed += 1)))
    for (const { name, massKg, seed: number } of athletes) {
      const bornOn = `${youngest - (number % 12)}-${String(1 + (number % 12)).padStart(2, '0')}-15`
      const form = { name, bornOn, recordedMassKg: Math.round(massKg), squadIds: [squadId] }
      athleteIds.set(name, (await addAthlete(deps, admin, form)).id)
    }
    squads.push({ squad, squadId, athletes })
  }
  return { athleteIds, squads }
}

/** Invited and accepted; the invitation's mail then has nothing to say any more, and is not sent. */
async function join(
  deps: Deps,
  admin: Caller,
  account: DemoAccount,
  athleteIds: ReadonlyMap<string, string>,
): Promise<Caller> {
  const { name, email, roles, athlete } = account
  const athleteId = (athlete && athleteIds.get(athlete)) || null
  const { id } = await invite(deps, admin, { name, email, roles, athleteId })
  const token = await deps.db.inIdentity((tx) => openInvitationLink(tx, id))
  return accept(deps, account, token ?? '')
}

const accept = (deps: Deps, { name, email }: DemoAccount, token: string) =>
  acceptByToken(deps, token, { name, password: demoPassword }, email)
