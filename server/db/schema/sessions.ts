import { sql } from 'drizzle-orm'
import { date, doublePrecision, foreignKey, index, primaryKey, text, uuid } from 'drizzle-orm/pg-core'
import {
  club,
  clubId,
  createdAt,
  id,
  moment,
  ownClubPolicy,
  rowVersion,
  staffOnlyPolicy,
  staffOrPolicy,
} from './base.ts'
import { clubs, memberships } from './identity.ts'
import { athletes, squads } from './people-of-club.ts'

/** A testing session. `date` is the club's local date. */
export const sessions = club.table(
  'sessions',
  {
    clubId: clubId().references(() => clubs.id),
    id: id(),
    date: date('date').notNull(),
    title: text('title').notNull(),
    place: text('place'),
    note: text('note'),
    /** Protocol that its recordings are read as unless a trial says otherwise. */
    protocol: text('protocol').notNull(),
    /** The rest of that test: `protocol` alone does not make two results comparable. */
    side: text('side').notNull().default('both'),
    externalLoadKg: doublePrecision('external_load_kg').notNull().default(0),
    boxHeightM: doublePrecision('box_height_m'),
    arms: text('arms').notNull().default('hips'),
    createdBy: uuid('created_by').notNull(),
    /** Of the publication that athletes read now. */
    publishedAt: moment('published_at'),
    version: rowVersion(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    index('sessions_date').on(t.clubId, t.date),
    foreignKey({
      columns: [t.clubId, t.createdBy],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    ownClubPolicy('sessions'),
    staffOrPolicy('sessions', sql`published_at is not null`),
  ],
)

export const sessionSquads = club.table(
  'session_squads',
  {
    clubId: clubId(),
    sessionId: uuid('session_id').notNull(),
    squadId: uuid('squad_id').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.sessionId, t.squadId] }),
    foreignKey({ columns: [t.clubId, t.sessionId], foreignColumns: [sessions.clubId, sessions.id] }),
    foreignKey({ columns: [t.clubId, t.squadId], foreignColumns: [squads.clubId, squads.id] }),
    ownClubPolicy('session_squads'),
    staffOnlyPolicy('session_squads'),
  ],
)

/** The athletes on the sheet from the start: its squads' members on the day it was made, and any added since. */
export const sessionAthletes = club.table(
  'session_athletes',
  {
    clubId: clubId(),
    sessionId: uuid('session_id').notNull(),
    athleteId: uuid('athlete_id').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.sessionId, t.athleteId] }),
    index('session_athletes_athlete').on(t.clubId, t.athleteId),
    foreignKey({ columns: [t.clubId, t.sessionId], foreignColumns: [sessions.clubId, sessions.id] }),
    foreignKey({ columns: [t.clubId, t.athleteId], foreignColumns: [athletes.clubId, athletes.id] }),
    ownClubPolicy('session_athletes'),
    staffOnlyPolicy('session_athletes'),
  ],
)

/** Each act of publishing; athletes read the trials and analyses pinned by the newest one. */
export const publications = club.table(
  'publications',
  {
    clubId: clubId(),
    id: id(),
    sessionId: uuid('session_id').notNull(),
    publishedBy: uuid('published_by').notNull(),
    publishedAt: moment('published_at')
      .notNull()
      .default(sql`now()`),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    index('publications_session').on(t.clubId, t.sessionId, t.publishedAt),
    foreignKey({ columns: [t.clubId, t.sessionId], foreignColumns: [sessions.clubId, sessions.id] }),
    foreignKey({
      columns: [t.clubId, t.publishedBy],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    ownClubPolicy('publications'),
    staffOrPolicy('publications', sql`true`),
  ],
)
