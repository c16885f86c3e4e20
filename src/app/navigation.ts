import { roles, type Role, staffRoles } from '../../shared/contracts/roles.ts'
import { paths } from '../lib/paths.ts'

export interface NavItem {
  path: string
  words: string
  /** Pages under another address that belong to this one. */
  holds?: string
  roles: readonly Role[]
}

/** In the order of the bar. The first that a person may open is where they start. */
const items: NavItem[] = [
  { path: paths.sessions, words: 'Sessions', holds: '/trials/', roles: ['coach', 'physio'] },
  { path: paths.athletes, words: 'Athletes', roles: ['coach', 'physio'] },
  { path: paths.landingWatch, words: 'Landing watch', roles: ['physio'] },
  { path: paths.people, words: 'People', roles: ['admin'] },
  { path: paths.squads, words: 'Squads', roles: ['coach', 'admin'] },
  { path: paths.seats, words: 'Seats', roles: ['admin'] },
  { path: paths.billing, words: 'Billing', roles: ['admin'] },
  { path: paths.settings, words: 'Settings', roles: staffRoles },
  { path: paths.me, words: 'My results', roles: ['athlete'] },
  { path: paths.methods, words: 'Methods', roles },
]

export function navItemsFor(held: readonly Role[]): NavItem[] {
  return items.filter((item) => item.roles.some((role) => held.includes(role)))
}

/** Where a person starts. Everybody has at least the account page. */
export function startPathFor(held: readonly Role[]): string {
  return navItemsFor(held)[0]?.path ?? paths.account
}
