import { sql } from 'drizzle-orm'
import { date, doublePrecision, foreignKey, index, jsonb, primaryKey, text, uuid } from 'drizzle-orm/pg-core'
import { club, clubId, currentPerson, moment, ownClubPolicy, staffOrPolicy } from './base.ts'
import { athletes } from './people-of-club.ts'
import { sessions } from './sessions.ts'

/**
 * Athlete × session × test: the included trials' numbers in arrays, one place a trial, in the order of `trialIds`.
 * `edition` 'working' follows the sheet; 'published' holds what the newest publication pinned, and athletes read only that.
 * A failed check's metrics stand as null in the arrays. Rebuilt whenever a trial changes; nothing that reads many scans trials.
 */
export const sessionResults = club.table(
  'session_results',
  {
    clubId: clubId(),
    athleteId: uuid('athlete_id').notNull(),
    sessionId: uuid('session_id').notNull(),
    /** shared/contracts/tests.ts testKey: protocol, side, load, box, arms. */
    testKey: text('test_key').notNull(),
    edition: text('edition').notNull(),
    protocol: text('protocol').notNull(),
    side: text('side').notNull(),
    externalLoadKg: doublePrecision('external_load_kg').notNull(),
    boxHeightM: doublePrecision('box_height_m'),
    arms: text('arms').notNull(),
    sessionDate: date('session_date').notNull(),
    trialIds: uuid('trial_ids').array().notNull(),
    analysisIds: uuid('analysis_ids').array().notNull(),
    metricValues: jsonb('metric_values').$type<Record<string, (number | null)[]>>().notNull(),
    metricU: jsonb('metric_u').$type<Record<string, (number | null)[]>>().notNull(),
    metricURepeat: jsonb('metric_u_repeat').$type<Record<string, (number | null)[]>>().notNull(),
    rebuiltAt: moment('rebuilt_at')
      .notNull()
      .default(sql`now()`),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.athleteId, t.sessionId, t.testKey, t.edition] }),
    index('session_results_session').on(t.clubId, t.sessionId, t.edition),
    index('session_results_date').on(t.clubId, t.edition, t.testKey, t.sessionDate),
    foreignKey({ columns: [t.clubId, t.athleteId], foreignColumns: [athletes.clubId, athletes.id] }),
    foreignKey({ columns: [t.clubId, t.sessionId], foreignColumns: [sessions.clubId, sessions.id] }),
    ownClubPolicy('session_results'),
    staffOrPolicy(
      'session_results',
      sql`edition = 'published' and exists (select 1 from club.athletes a where a.club_id = session_results.club_id and a.id = session_results.athlete_id and a.person_id = ${currentPerson})`,
    ),
  ],
)

/**
 * How much trials of a session vary within an athlete, pooled over its athletes, by metric: [SD, degrees of
 * freedom]. Rebuilt with the results of its edition; says nothing of any one athlete, so that an athlete's own
 * page can carry it without a look at anyone else's rows.
 */
export const trialSpreads = club.table(
  'trial_spreads',
  {
    clubId: clubId(),
    sessionId: uuid('session_id').notNull(),
    testKey: text('test_key').notNull(),
    edition: text('edition').notNull(),
    spreads: jsonb('spreads').$type<Record<string, [number, number]>>().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.sessionId, t.testKey, t.edition] }),
    foreignKey({ columns: [t.clubId, t.sessionId], foreignColumns: [sessions.clubId, sessions.id] }),
    ownClubPolicy('trial_spreads'),
    staffOrPolicy('trial_spreads', sql`edition = 'published'`),
  ],
)
