import { sql } from 'drizzle-orm'
import { foreignKey, index, integer, jsonb, pgPolicy, primaryKey, text, uuid } from 'drizzle-orm/pg-core'
import {
  club,
  clubId,
  createdAt,
  currentClub,
  currentPerson,
  id,
  moment,
  ownClubPolicy,
  webRole,
} from './base.ts'
import { bytea, clubs, memberships } from './identity.ts'

/** The first answer to a mutation, given again when the same key comes back. */
export const idempotencyKeys = club.table(
  'idempotency_keys',
  {
    clubId: clubId(),
    personId: uuid('person_id').notNull(),
    key: text('key').notNull(),
    /** Method and path pattern. */
    route: text('route').notNull(),
    /** SHA-256 of params and body: the same key with another request is an error. */
    requestHash: bytea('request_hash').notNull(),
    /** null while the first request is still at work. */
    status: integer('status'),
    response: jsonb('response').$type<unknown>(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.personId, t.key] }),
    index('idempotency_keys_age').on(t.createdAt),
    foreignKey({
      columns: [t.clubId, t.personId],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    pgPolicy('idempotency_keys_own', {
      for: 'all',
      to: [webRole],
      using: sql`club_id = ${currentClub} and person_id = ${currentPerson}`,
      withCheck: sql`club_id = ${currentClub} and person_id = ${currentPerson}`,
    }),
  ],
)

/** Who did what to which row, by ids only; names come by join. */
export const auditLog = club.table(
  'audit_log',
  {
    clubId: clubId().references(() => clubs.id),
    id: id(),
    personId: uuid('person_id'),
    /** e.g. 'trial.set-aside', 'session.publish'. */
    action: text('action').notNull(),
    subjectKind: text('subject_kind').notNull(),
    subjectId: uuid('subject_id').notNull(),
    detail: jsonb('detail').$type<Record<string, unknown>>().notNull().default({}),
    at: moment('at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    index('audit_log_at').on(t.clubId, t.at),
    foreignKey({
      columns: [t.clubId, t.personId],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    ownClubPolicy('audit_log'),
  ],
)
