import type { Role } from '../../shared/contracts/roles.ts'
import type { ClubContext } from '../db/database.ts'

/** The signed-in person in the club they are signed in to: what a service acts for. */
export interface Caller extends ClubContext {
  personId: string
  roles: readonly Role[]
  /** The athlete record of this person in this club, if any. */
  athleteId: string | null
  /** From when the club only reads; null or left out: never, as things stand. */
  readsOnlyFrom?: Date | null
}

declare global {
  // Passport's own place for the signed-in user.
  // eslint-disable-next-line @typescript-eslint/no-namespace -- declaration merging needs it
  namespace Express {
    // eslint-disable-next-line @typescript-eslint/no-empty-object-type -- takes over Caller as it is
    interface User extends Caller {}
  }
}
