import { sql } from 'drizzle-orm'
import {
  boolean,
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
import type { MovedEvents } from '../../../shared/mechanics/events/event-order.ts'
import type { ChangedSettings } from '../../../shared/mechanics/settings/choices.ts'
import type {
  Contact,
  EventName,
  EventTime,
  Ledger,
  Note,
  Sides,
  TrialCheck,
} from '../../../shared/mechanics/types.ts'
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
import { bytea, memberships } from './identity.ts'
import { athletes } from './people-of-club.ts'
import { publications, sessions } from './sessions.ts'
import { uploads } from './uploads.ts'

/** True for the athlete's own published trials: the row is pinned, and its athlete is this person's. */
const ownPublishedTrial = (clubColumn: string, trialColumn: string) =>
  sql.raw(
    `exists (select 1 from club.published_trials p where p.club_id = ${clubColumn} and p.trial_id = ${trialColumn} and p.current)`,
  )

/** One trial of a recording. In the Tray until it has an athlete; never deleted, but set aside with a reason. */
export const trials = club.table(
  'trials',
  {
    clubId: clubId(),
    id: id(),
    sessionId: uuid('session_id').notNull(),
    uploadId: uuid('upload_id').notNull(),
    /** Place in the recording, from 1. */
    ordinal: integer('ordinal').notNull().default(1),
    athleteId: uuid('athlete_id'),
    /** 'file-name' or 'hand'; null in the Tray. */
    assignedBy: text('assigned_by'),
    protocol: text('protocol').notNull(),
    side: text('side').notNull().default('both'),
    externalLoadKg: doublePrecision('external_load_kg').notNull().default(0),
    boxHeightM: doublePrecision('box_height_m'),
    arms: text('arms').notNull().default('hips'),
    setAsideReason: text('set_aside_reason'),
    setAsideBy: uuid('set_aside_by'),
    setAsideAt: moment('set_aside_at'),
    startS: doublePrecision('start_s').notNull(),
    endS: doublePrecision('end_s').notNull(),
    /** Total force for a sparkline, whole newtons, evenly over the trial. */
    preview: jsonb('preview').$type<number[]>().notNull(),
    /** When its file was dropped: the order on the sheet, whichever file a worker happened to read first. */
    droppedAt: moment('dropped_at').notNull().defaultNow(),
    version: rowVersion(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    uniqueIndex('trials_of_upload').on(t.clubId, t.uploadId, t.ordinal),
    index('trials_session').on(t.clubId, t.sessionId),
    index('trials_athlete').on(t.clubId, t.athleteId),
    foreignKey({ columns: [t.clubId, t.sessionId], foreignColumns: [sessions.clubId, sessions.id] }),
    foreignKey({ columns: [t.clubId, t.uploadId], foreignColumns: [uploads.clubId, uploads.id] }),
    foreignKey({ columns: [t.clubId, t.athleteId], foreignColumns: [athletes.clubId, athletes.id] }),
    foreignKey({
      columns: [t.clubId, t.setAsideBy],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    ownClubPolicy('trials'),
    staffOrPolicy('trials', ownPublishedTrial('trials.club_id', 'trials.id')),
  ],
)

/** Samples as read: whole millinewtons, differences, byte planes, deflated (shared/recordings/samples-codec.ts). */
export const trialSamples = club.table(
  'trial_samples',
  {
    clubId: clubId(),
    trialId: uuid('trial_id').notNull(),
    sampleRateHz: doublePrecision('sample_rate_hz').notNull(),
    sampleCount: integer('sample_count').notNull(),
    /** In the order of the bytes: left, right, single or total. */
    channels: text('channels').array().notNull(),
    filledSamples: integer('filled_samples').notNull(),
    timeBaseError: doublePrecision('time_base_error').notNull(),
    encoding: text('encoding').notNull(),
    bytes: bytea('bytes').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.trialId] }),
    foreignKey({ columns: [t.clubId, t.trialId], foreignColumns: [trials.clubId, trials.id] }),
    ownClubPolicy('trial_samples'),
    staffOrPolicy('trial_samples', ownPublishedTrial('trial_samples.club_id', 'trial_samples.trial_id')),
  ],
)

/**
 * Every time that a person moved events of a trial or put them back: all that are moved from then on, and why. Never
 * changed, but for being superseded by the next; the newest of a trial holds, and holds nothing where it is empty.
 */
export const eventMoves = club.table(
  'event_moves',
  {
    clubId: clubId(),
    id: id(),
    trialId: uuid('trial_id').notNull(),
    /** Seconds from the trial's first sample, by event; empty: all back to automatic. */
    events: jsonb('events').$type<MovedEvents>().notNull(),
    /** Where the events that this changed stood before, seconds; null where the trial had no such event. */
    stood: jsonb('stood').$type<Partial<Record<EventName, number | null>>>().notNull(),
    reason: text('reason'),
    movedBy: uuid('moved_by').notNull(),
    movedAt: moment('moved_at').notNull(),
    supersededAt: moment('superseded_at'),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    index('event_moves_trial').on(t.clubId, t.trialId, t.movedAt),
    uniqueIndex('event_moves_current')
      .on(t.clubId, t.trialId)
      .where(sql`superseded_at is null`),
    foreignKey({ columns: [t.clubId, t.trialId], foreignColumns: [trials.clubId, trials.id] }),
    foreignKey({
      columns: [t.clubId, t.movedBy],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    ownClubPolicy('event_moves'),
    staffOnlyPolicy('event_moves'),
  ],
)

/** What went into an analysis besides the samples; its hash makes the job safe to run twice. */
export interface AnalysisInputs {
  test: { protocol: string; side: string; externalLoadKg: number; boxHeightM: number | null; arms: string }
  recordedMassKg: number | null
  gravity: number
  calibrationU: Record<string, number>
  /** The engine's own settings, as `default-<version>`. */
  settings: string
  /** What the club changed of them; absent where it changed none. */
  changedSettings?: ChangedSettings
  /** Absent where no event was moved, so that the hash is that of a trial that nobody touched. */
  movedEvents?: MovedEvents
}

/** One per trial, engine version and inputs. Superseded by a newer one, never changed. */
export const analyses = club.table(
  'analyses',
  {
    clubId: clubId(),
    id: id(),
    trialId: uuid('trial_id').notNull(),
    engineVersion: text('engine_version').notNull(),
    inputsHash: bytea('inputs_hash').notNull(),
    inputs: jsonb('inputs').$type<AnalysisInputs>().notNull(),
    events: jsonb('events').$type<Partial<Record<EventName, EventTime>>>().notNull(),
    /** Values by metric key, SI units of the catalogue. Uncertainties apart: reading one metric of many rows stays cheap. */
    metricValues: jsonb('metric_values').$type<Record<string, number>>().notNull(),
    /** [U, k, URepeat, kRepeat] by metric key. */
    metricUncertainties: jsonb('metric_uncertainties')
      .$type<Record<string, [number | null, number, number | null, number]>>()
      .notNull(),
    sides: jsonb('sides').$type<Sides | null>(),
    ledger: jsonb('ledger').$type<Ledger | null>(),
    /** Of a drop jump or of hops; null where the test has none. */
    contacts: jsonb('contacts').$type<Contact[] | null>(),
    checks: jsonb('checks').$type<TrialCheck[]>().notNull(),
    missing: jsonb('missing').$type<{ key: string; reason: string }[]>().notNull(),
    notes: jsonb('notes').$type<Note[]>().notNull(),
    supersededAt: moment('superseded_at'),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    uniqueIndex('analyses_inputs').on(t.clubId, t.trialId, t.engineVersion, t.inputsHash),
    uniqueIndex('analyses_current')
      .on(t.clubId, t.trialId)
      .where(sql`superseded_at is null`),
    foreignKey({ columns: [t.clubId, t.trialId], foreignColumns: [trials.clubId, trials.id] }),
    ownClubPolicy('analyses'),
    staffOrPolicy(
      'analyses',
      sql.raw(
        'exists (select 1 from club.published_trials p where p.club_id = analyses.club_id and p.analysis_id = analyses.id and p.current)',
      ),
    ),
  ],
)

/** Pins of a publication: what an athlete reads, whatever is recomputed later. `athleteId` is that of the day. */
export const publishedTrials = club.table(
  'published_trials',
  {
    clubId: clubId(),
    publicationId: uuid('publication_id').notNull(),
    trialId: uuid('trial_id').notNull(),
    analysisId: uuid('analysis_id').notNull(),
    athleteId: uuid('athlete_id').notNull(),
    /** False once a newer publication of the session took its place. */
    current: boolean('current').notNull().default(true),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.publicationId, t.trialId] }),
    index('published_trials_trial').on(t.clubId, t.trialId),
    index('published_trials_analysis').on(t.clubId, t.analysisId),
    foreignKey({
      columns: [t.clubId, t.publicationId],
      foreignColumns: [publications.clubId, publications.id],
    }),
    foreignKey({ columns: [t.clubId, t.trialId], foreignColumns: [trials.clubId, trials.id] }),
    foreignKey({ columns: [t.clubId, t.analysisId], foreignColumns: [analyses.clubId, analyses.id] }),
    foreignKey({ columns: [t.clubId, t.athleteId], foreignColumns: [athletes.clubId, athletes.id] }),
    ownClubPolicy('published_trials'),
    staffOrPolicy(
      'published_trials',
      sql`exists (select 1 from club.athletes a where a.club_id = published_trials.club_id and a.id = published_trials.athlete_id and a.person_id = ${currentPerson})`,
    ),
  ],
)
