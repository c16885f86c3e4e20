import {
  changeAthlete,
  createAthlete,
  getAthlete,
  listAthletes,
  type Athlete,
} from '../../../shared/contracts/athletes.ts'
import {
  changeClubSettings,
  getClubSettings,
  getSeats,
  type ClubSettings,
} from '../../../shared/contracts/clubs.ts'
import {
  changePerson,
  invitePerson,
  listPeople,
  resendInvitation,
  withdrawInvitation,
  type Invitation,
  type Person,
} from '../../../shared/contracts/people.ts'
import type { ResultPoint } from '../../../shared/contracts/results.ts'
import { getSeatPlan } from '../../../shared/contracts/seats.ts'
import { changeSquad, createSquad, listSquads, type Squad } from '../../../shared/contracts/squads.ts'
import { answer, Refusal } from './answer.ts'
import { anAthlete, anInvitation, aSquad } from './club-rows.ts'

export interface ClubState {
  athletes: Athlete[]
  squads: Squad[]
  people: Person[]
  invitations: Invitation[]
  results: ResultPoint[]
  settings: ClubSettings
  paidSeats: number
}

/** A club as the server keeps it: what a mutation changes, the next reading shows. */
export function inventedClub(start: Partial<ClubState> = {}) {
  const club: ClubState = {
    athletes: [],
    squads: [],
    people: [],
    invitations: [],
    results: [],
    settings: { landingPeakLimits: {}, version: 1 },
    paidSeats: 60,
    ...start,
  }
  return {
    club,
    handlers: [
      ...rosterHandlers(club),
      ...squadHandlers(club),
      ...peopleHandlers(club),
      ...clubHandlers(club),
    ],
  }
}

interface Row {
  id: string
  version: number
}

function rowOf<R extends Row>(rows: R[], id: string): R {
  const row = rows.find((candidate) => candidate.id === id)
  if (row === undefined) throw new Refusal('not-found', 404, 'This is not here.')
  return row
}

/** Changes the row in place as the server would: only over the version that the caller has seen. */
function changeRow<R extends Row>(
  rows: R[],
  id: string,
  { version, ...change }: Partial<R> & { version: number },
): R {
  const row = rowOf(rows, id)
  if (row.version !== version) throw stale(row)
  const given = Object.entries(change).filter(([, value]) => value !== undefined)
  return Object.assign(row, Object.fromEntries(given), { version: version + 1 })
}

const stale = (newer: unknown) =>
  new Refusal('stale-version', 409, 'Somebody changed this since you opened it.', { newer })

function rosterHandlers(club: ClubState) {
  return [
    answer(listAthletes, () => ({ athletes: club.athletes })),
    answer(getAthlete, ({ params }) => ({
      athlete: rowOf(club.athletes, params.athleteId),
      results: club.results,
    })),
    answer(createAthlete, ({ body }) => {
      const athlete = anAthlete(club.athletes.length + 1, body)
      club.athletes.push(athlete)
      return athlete
    }),
    answer(changeAthlete, ({ params, body }) => changeRow(club.athletes, params.athleteId, body as never)),
  ]
}

function squadHandlers(club: ClubState) {
  const refuseTaken = (name: string | undefined, except: string | null) => {
    const taken = club.squads.some((squad) => squad.name === name && squad.id !== except)
    if (taken) throw new Refusal('name-taken', 409, 'Another squad has this name.')
  }
  return [
    answer(listSquads, () => ({ squads: club.squads })),
    answer(createSquad, ({ body }) => {
      refuseTaken(body.name, null)
      const squad = aSquad(club.squads.length + 1, body)
      club.squads.push(squad)
      return squad
    }),
    answer(changeSquad, ({ params, body }) => {
      refuseTaken(body.name, params.squadId)
      return changeRow(club.squads, params.squadId, body as never)
    }),
  ]
}

function peopleHandlers(club: ClubState) {
  return [
    answer(listPeople, () => ({ people: club.people, invitations: club.invitations })),
    answer(invitePerson, ({ body }) => {
      if (club.people.some(({ email }) => email === body.email)) {
        throw new Refusal('email-taken', 409, 'Somebody of the club has this address.')
      }
      const invitation = anInvitation(club.invitations.length + 1, body)
      club.invitations.push(invitation)
      return invitation
    }),
    answer(resendInvitation, ({ params, body }) =>
      changeRow(club.invitations, params.invitationId, {
        ...body,
        expired: false,
        expiresAt: '2027-01-05T09:00:00.000Z',
      }),
    ),
    answer(withdrawInvitation, ({ params }) => {
      club.invitations.splice(club.invitations.indexOf(rowOf(club.invitations, params.invitationId)), 1)
      return null
    }),
    answer(changePerson, ({ params, body }) => {
      const person = rowOf(club.people, params.personId)
      const keeps = (body.roles ?? person.roles).includes('admin') && (body.active ?? person.active)
      const others = club.people.some(
        (other) => other !== person && other.active && other.roles.includes('admin'),
      )
      if (!keeps && !others) throw new Refusal('last-admin', 409, 'This is the last active admin.')
      return changeRow(club.people, params.personId, body as never)
    }),
  ]
}

function clubHandlers(club: ClubState) {
  return [
    answer(getClubSettings, () => club.settings),
    answer(changeClubSettings, ({ body }) => {
      if (body.version !== club.settings.version) throw stale(club.settings)
      club.settings = { ...body, version: body.version + 1 }
      return club.settings
    }),
    answer(getSeatPlan, () => ({
      paid: club.paidSeats,
      used: 0,
      byItself: true,
      version: 0,
      athletes: [],
    })),
    answer(getSeats, () => ({
      used: club.athletes.filter(({ archived }) => !archived).length,
      paid: club.paidSeats,
      staff: club.people.filter(({ roles, active }) => active && roles.some((role) => role !== 'athlete'))
        .length,
    })),
  ]
}
