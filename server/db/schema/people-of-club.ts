import { sql } from 'drizzle-orm'
import {
  boolean,
  date,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  primaryKey,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import {
  club,
  clubId,
  createdAt,
  currentPerson,
  id,
  moment,
  ownClubPolicy,
  rowVersion,
  staffOnlyPolicy,
  staffOrPolicy,
} from './base.ts'
import { clubs, memberships } from './identity.ts'

/** The club's choices. `landingPeakLimits`: test key → peak in body weights; empty until the club sets one. */
export const settings = club.table(
  'settings',
  {
    clubId: clubId()
      .primaryKey()
      .references(() => clubs.id),
    landingPeakLimits: jsonb('landing_peak_limits').$type<Record<string, number>>().notNull().default({}),
    /** Paid seats; a seat is an active athlete. */
    seats: integer('seats').notNull().default(0),
    /** Set where the club holds invented demonstration data, so that every screen can say so. */
    demo: boolean('demo').notNull().default(false),
    version: rowVersion(),
  },
  () => [ownClubPolicy('settings'), staffOrPolicy('settings', sql`true`)],
)

export const squads = club.table(
  'squads',
  {
    clubId: clubId().references(() => clubs.id),
    id: id(),
    name: text('name').notNull(),
    archivedAt: moment('archived_at'),
    version: rowVersion(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    uniqueIndex('squads_name')
      .on(t.clubId, sql`lower(${t.name})`)
      .where(sql`archived_at is null`),
    ownClubPolicy('squads'),
    staffOrPolicy('squads', sql`true`),
  ],
)

/** An athlete is a record of the club; a person is linked by an accepted invitation. */
export const athletes = club.table(
  'athletes',
  {
    clubId: clubId().references(() => clubs.id),
    id: id(),
    name: text('name').notNull(),
    /** Folded for matching (shared/contracts/names.ts): lower case, no accents, single blanks. */
    nameKey: text('name_key').notNull(),
    bornOn: date('born_on'),
    /** The club's recorded body mass, kg: a check against a wrong athlete. */
    recordedMassKg: doublePrecision('recorded_mass_kg'),
    personId: uuid('person_id'),
    archivedAt: moment('archived_at'),
    version: rowVersion(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    uniqueIndex('athletes_person').on(t.clubId, t.personId),
    index('athletes_name').on(t.clubId, t.nameKey),
    foreignKey({
      columns: [t.clubId, t.personId],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    ownClubPolicy('athletes'),
    staffOrPolicy('athletes', sql`person_id = ${currentPerson}`),
  ],
)

export const squadMembers = club.table(
  'squad_members',
  {
    clubId: clubId(),
    squadId: uuid('squad_id').notNull(),
    athleteId: uuid('athlete_id').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.squadId, t.athleteId] }),
    index('squad_members_athlete').on(t.clubId, t.athleteId),
    foreignKey({ columns: [t.clubId, t.squadId], foreignColumns: [squads.clubId, squads.id] }),
    foreignKey({ columns: [t.clubId, t.athleteId], foreignColumns: [athletes.clubId, athletes.id] }),
    ownClubPolicy('squad_members'),
    staffOnlyPolicy('squad_members'),
  ],
)
