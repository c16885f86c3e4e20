import { randomUUID } from 'node:crypto'
import type { Database } from '../../server/db/database.ts'
import { createClub, type NewClub } from '../../server/modules/clubs/clubs.service.ts'

/** A valid club without people. Invented, like everything the builders make. */
export function buildClub(db: Database, club: Partial<NewClub> = {}): Promise<string> {
  return createClub(
    { db },
    { name: `Club ${randomUUID().slice(0, 8)}`, timeZone: 'Europe/Vienna', seats: 50, demo: false, ...club },
  )
}
