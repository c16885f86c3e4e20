import { doublePrecision, foreignKey, integer, jsonb, primaryKey, uuid } from 'drizzle-orm/pg-core'
import type { ChangedSettings } from '../../../shared/mechanics/settings/choices.ts'
import { club, clubId, createdAt, ownClubPolicy, staffOnlyPolicy } from './base.ts'
import { clubs, memberships } from './identity.ts'

/**
 * What the club's analyses are made with, as one edition after the other: each change is a new row, and the newest
 * holds. Edition 1 is what every club begins with; it has no row.
 */
const edition = () => integer('edition').notNull()

/** The engine's settings that the club changed; whatever is absent stands at the engine's default. */
export const measuringSettings = club.table(
  'measuring_settings',
  {
    clubId: clubId().references(() => clubs.id),
    edition: edition(),
    changed: jsonb('changed').$type<ChangedSettings>().notNull(),
    changedBy: uuid('changed_by').notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.edition] }),
    foreignKey({
      columns: [t.clubId, t.changedBy],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    ownClubPolicy('measuring_settings'),
    staffOnlyPolicy('measuring_settings'),
  ],
)

/** How far the club's plates are to be trusted, and where they stand: for all plates of the club alike. */
export const plateCalibrations = club.table(
  'plate_calibrations',
  {
    clubId: clubId().references(() => clubs.id),
    edition: edition(),
    /** Expanded relative uncertainty (k = 2) by channel, e.g. 0.005. */
    leftU: doublePrecision('left_u').notNull(),
    rightU: doublePrecision('right_u').notNull(),
    singleU: doublePrecision('single_u').notNull(),
    totalU: doublePrecision('total_u').notNull(),
    /** Both null where the place is unknown. */
    latitudeDeg: doublePrecision('latitude_deg'),
    altitudeM: doublePrecision('altitude_m'),
    changedBy: uuid('changed_by').notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.edition] }),
    foreignKey({
      columns: [t.clubId, t.changedBy],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    ownClubPolicy('plate_calibrations'),
    staffOnlyPolicy('plate_calibrations'),
  ],
)
