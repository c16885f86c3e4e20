import { sql } from 'drizzle-orm'
import { boolean, foreignKey, index, integer, primaryKey, uniqueIndex, uuid } from 'drizzle-orm/pg-core'
import { club, clubId, id, moment, ownClubPolicy, staffOnlyPolicy } from './base.ts'
import { clubs } from './identity.ts'
import { athletes } from './people-of-club.ts'

/** Who holds or held a seat. One that was released stays taken until `freesAt`: the cooling period. */
export const seats = club.table(
  'seats',
  {
    clubId: clubId(),
    id: id(),
    athleteId: uuid('athlete_id').notNull(),
    assignedAt: moment('assigned_at').notNull(),
    releasedAt: moment('released_at'),
    freesAt: moment('frees_at'),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    uniqueIndex('seats_held')
      .on(t.clubId, t.athleteId)
      .where(sql`released_at is null`),
    index('seats_athlete').on(t.clubId, t.athleteId),
    foreignKey({ columns: [t.clubId, t.athleteId], foreignColumns: [athletes.clubId, athletes.id] }),
    ownClubPolicy('seats'),
    staffOnlyPolicy('seats'),
  ],
)

/** Athletes who get the next seats that become free, the longest waiting first. */
export const seatWaits = club.table(
  'seat_waits',
  {
    clubId: clubId(),
    athleteId: uuid('athlete_id').notNull(),
    since: moment('since').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.athleteId] }),
    foreignKey({ columns: [t.clubId, t.athleteId], foreignColumns: [athletes.clubId, athletes.id] }),
    ownClubPolicy('seat_waits'),
    staffOnlyPolicy('seat_waits'),
  ],
)

/** Whether seats are given by themselves; no row: they are. */
export const seatRules = club.table(
  'seat_rules',
  {
    clubId: clubId()
      .primaryKey()
      .references(() => clubs.id),
    byItself: boolean('by_itself').notNull(),
    version: integer('version').notNull().default(1),
  },
  () => [ownClubPolicy('seat_rules'), staffOnlyPolicy('seat_rules')],
)
