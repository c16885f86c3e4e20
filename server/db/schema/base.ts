import { sql } from 'drizzle-orm'
import { integer, pgPolicy, pgRole, pgSchema, timestamp, uuid } from 'drizzle-orm/pg-core'

/** People, clubs, sign-in and mail: reached as `underfoot_identity`, a role that sees no club data. */
export const identity = pgSchema('identity')

/** Everything of a club. Every key begins with `club_id`, every table is under row-level security. */
export const club = pgSchema('club')

/** Made by the operator or by `npm start`, before the first migration. */
export const webRole = pgRole('underfoot_web').existing()
export const workerRole = pgRole('underfoot_worker').existing()
export const identityRole = pgRole('underfoot_identity').existing()

/** The club of the running transaction (`inClub`). A used setting comes back as '', hence nullif. */
export const currentClub = sql`nullif(current_setting('app.club_id', true), '')::uuid`
/** The person of the running transaction; null for the worker. */
export const currentPerson = sql`nullif(current_setting('app.person_id', true), '')::uuid`
/** True where the person (or the worker) may read the whole club's measurements: coach, physio, admin, worker. */
const isStaff = sql`coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)staff(,|$)'`
/** True where the person is an admin of the club. */
export const isAdmin = sql`coalesce(current_setting('app.capabilities', true), '') ~ '(^|,)admin(,|$)'`

export const clubId = () => uuid('club_id').notNull()
export const id = () => uuid('id').notNull().defaultRandom()
export const rowVersion = () => integer('version').notNull().default(1)
export const createdAt = () => timestamp('created_at', { withTimezone: true }).notNull().defaultNow()
export const moment = (name: string) => timestamp(name, { withTimezone: true })

/** A club's own rows and no others, whoever of the club asks. */
export const ownClubPolicy = (table: string) =>
  pgPolicy(`${table}_own_club`, {
    as: 'permissive',
    for: 'all',
    to: [webRole, workerRole],
    using: sql`club_id = ${currentClub}`,
    withCheck: sql`club_id = ${currentClub}`,
  })

/** Narrows the own-club policy further: staff see all rows, others those that `condition` allows. */
export const staffOrPolicy = (table: string, condition: ReturnType<typeof sql>) =>
  pgPolicy(`${table}_staff_or_own`, {
    as: 'restrictive',
    for: 'all',
    to: [webRole, workerRole],
    using: sql`${isStaff} or (${condition})`,
    withCheck: sql`${isStaff}`,
  })

/** Rows that only staff read and write. */
export const staffOnlyPolicy = (table: string) =>
  pgPolicy(`${table}_staff_only`, {
    as: 'restrictive',
    for: 'all',
    to: [webRole, workerRole],
    using: isStaff,
    withCheck: isStaff,
  })
