import type { Role } from '../../shared/contracts/roles.ts'

export const roleNames: Record<Role, string> = {
  coach: 'Coach',
  physio: 'Physio',
  athlete: 'Athlete',
  admin: 'Club admin',
}

/** What each role is for, where somebody chooses one. */
export const roleMeanings: Record<Role, string> = {
  coach: 'runs sessions, curates and publishes trials, keeps the roster',
  physio: 'runs sessions, sees the landings above the club’s limits',
  athlete: 'sees their own published results',
  admin: 'invites people, keeps squads, seats and settings',
}
