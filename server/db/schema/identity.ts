import { sql } from 'drizzle-orm'
import {
  boolean,
  customType,
  foreignKey,
  index,
  integer,
  json,
  jsonb,
  pgPolicy,
  primaryKey,
  text,
  timestamp,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import {
  createdAt,
  currentClub,
  currentPerson,
  id,
  identity,
  identityRole,
  isAdmin,
  moment,
  rowVersion,
  webRole,
  workerRole,
} from './base.ts'

export const bytea = customType<{ data: Buffer; driverData: Buffer }>({ dataType: () => 'bytea' })

const identityPolicy = (table: string) =>
  pgPolicy(`${table}_identity`, { for: 'all', to: [identityRole], using: sql`true`, withCheck: sql`true` })

export const clubs = identity.table(
  'clubs',
  {
    id: id().primaryKey(),
    name: text('name').notNull(),
    /** IANA name; a session's date is the club's local date. */
    timeZone: text('time_zone').notNull(),
    createdAt: createdAt(),
  },
  () => [
    identityPolicy('clubs'),
    pgPolicy('clubs_own', { for: 'select', to: [webRole, workerRole], using: sql`id = ${currentClub}` }),
  ],
)

export const people = identity.table(
  'people',
  {
    id: id().primaryKey(),
    /** Lower case; the address that signs in. */
    email: text('email').notNull(),
    name: text('name').notNull(),
    /** Argon2id; null until the invitation is accepted. */
    passwordHash: text('password_hash'),
    version: rowVersion(),
    createdAt: createdAt(),
  },
  (t) => [
    uniqueIndex('people_email').on(t.email),
    identityPolicy('people'),
    pgPolicy('people_of_club', {
      for: 'select',
      to: [webRole, workerRole],
      using: sql`id = ${currentPerson} or exists (select 1 from identity.memberships m where m.person_id = id and m.club_id = ${currentClub})`,
    }),
  ],
)

/** Roles of a person in a club. Several roles a person, several clubs a person. */
export const memberships = identity.table(
  'memberships',
  {
    clubId: uuid('club_id')
      .notNull()
      .references(() => clubs.id),
    personId: uuid('person_id')
      .notNull()
      .references(() => people.id),
    /** Of shared/contracts/roles.ts: coach, physio, athlete, admin. */
    roles: text('roles').array().notNull(),
    active: boolean('active').notNull().default(true),
    version: rowVersion(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.personId] }),
    index('memberships_person').on(t.personId),
    identityPolicy('memberships'),
    pgPolicy('memberships_own_club', {
      for: 'all',
      to: [webRole, workerRole],
      using: sql`club_id = ${currentClub}`,
      withCheck: sql`club_id = ${currentClub}`,
    }),
  ],
)

/** An invitation to a club; the token itself is only in the mail, here its SHA-256. */
export const invitations = identity.table(
  'invitations',
  {
    clubId: uuid('club_id')
      .notNull()
      .references(() => clubs.id),
    id: id(),
    tokenHash: bytea('token_hash').notNull(),
    email: text('email').notNull(),
    name: text('name').notNull(),
    roles: text('roles').array().notNull(),
    /** The athlete record that the person becomes, if any (club.athletes). */
    athleteId: uuid('athlete_id'),
    expiresAt: moment('expires_at').notNull(),
    acceptedAt: moment('accepted_at'),
    withdrawnAt: moment('withdrawn_at'),
    invitedBy: uuid('invited_by'),
    version: rowVersion(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    uniqueIndex('invitations_token').on(t.tokenHash),
    uniqueIndex('invitations_open')
      .on(t.clubId, t.email)
      .where(sql`accepted_at is null and withdrawn_at is null`),
    foreignKey({
      columns: [t.clubId, t.invitedBy],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    identityPolicy('invitations'),
    pgPolicy('invitations_own_club', {
      for: 'all',
      to: [webRole],
      using: sql`club_id = ${currentClub}`,
      withCheck: sql`club_id = ${currentClub}`,
    }),
    pgPolicy('invitations_admin', {
      as: 'restrictive',
      for: 'all',
      to: [webRole],
      using: isAdmin,
      withCheck: isAdmin,
    }),
  ],
)

export const passwordResets = identity.table(
  'password_resets',
  {
    id: id().primaryKey(),
    personId: uuid('person_id')
      .notNull()
      .references(() => people.id),
    tokenHash: bytea('token_hash').notNull(),
    expiresAt: moment('expires_at').notNull(),
    usedAt: moment('used_at'),
    createdAt: createdAt(),
  },
  (t) => [uniqueIndex('password_resets_token').on(t.tokenHash), identityPolicy('password_resets')],
)

/** connect-pg-simple's table; the column names are the package's. */
export const signInSessions = identity.table(
  'sign_in_sessions',
  {
    sid: text('sid').primaryKey(),
    sess: json('sess').notNull(),
    expire: timestamp('expire', { precision: 6 }).notNull(),
  },
  (t) => [
    index('sign_in_sessions_expire').on(t.expire),
    // For ending a person's other sign-ins; the path is passport's.
    index('sign_in_sessions_person').on(sql`(${t.sess} -> 'passport' -> 'user' ->> 'personId')`),
    pgPolicy('sign_in_sessions_web', {
      for: 'all',
      to: [webRole, identityRole],
      using: sql`true`,
      withCheck: sql`true`,
    }),
  ],
)

/** rate-limiter-flexible's table; the column names are the package's. */
export const rateLimits = identity.table(
  'rate_limits',
  {
    key: text('key').primaryKey(),
    points: integer('points').notNull().default(0),
    expire: customType<{ data: number }>({ dataType: () => 'bigint' })('expire'),
  },
  () => [pgPolicy('rate_limits_web', { for: 'all', to: [webRole], using: sql`true`, withCheck: sql`true` })],
)

/** Mail to be sent: written in the transaction of what it tells, sent by the worker, tried again if refused. */
export const outbox = identity.table(
  'outbox',
  {
    id: id().primaryKey(),
    clubId: uuid('club_id').references(() => clubs.id),
    toAddress: text('to_address').notNull(),
    /** Of server/modules/mail templates: 'invitation', 'password-reset', 'results-published'. */
    template: text('template').notNull(),
    /** What the template needs; tokens stand here only until the mail is sent. */
    payload: jsonb('payload').notNull(),
    attempts: integer('attempts').notNull().default(0),
    lastError: text('last_error'),
    sentAt: moment('sent_at'),
    createdAt: createdAt(),
  },
  () => [
    identityPolicy('outbox'),
    pgPolicy('outbox_write', { for: 'insert', to: [webRole, workerRole], withCheck: sql`true` }),
  ],
)
