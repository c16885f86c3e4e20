import { sql } from 'drizzle-orm'
import {
  boolean,
  foreignKey,
  index,
  integer,
  jsonb,
  primaryKey,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core'
import type { ChangedSettings } from '../../../shared/mechanics/settings/choices.ts'
import type { ForceChannel } from '../../../shared/mechanics/types.ts'
import { club, clubId, createdAt, id, moment, ownClubPolicy, staffOnlyPolicy } from './base.ts'
import { clubs, memberships } from './identity.ts'
import { athletes } from './people-of-club.ts'
import { sessions } from './sessions.ts'

/** What analyses are made with besides the trial's own facts, all of it resolved. */
export interface MadeWith {
  /** The engine's own settings, as `default-<version>`. */
  settings: string
  /** Absent where the club changed none. */
  changedSettings?: ChangedSettings
  /** m/s² */
  gravity: number
  calibrationU: Record<ForceChannel, number>
}

/** Bin → how many: bin k holds sizes from 1.02^k up to 1.02^(k + 1), so that a median is right to 1 %. */
export type Bins = Record<string, number>

/** What moved of one figure, in the catalogue's SI unit. */
export interface FigureMoves {
  /** Analyses whose value is another. */
  moved: number
  /** |change| */
  changes: Bins
  /** The change of the greatest size, with its sign. */
  greatest: number
  /** |change| / URepeat, where there is one. */
  multiples: Bins
  greatestMultiple: number | null
  /** Analyses whose U is another, and by what factor. */
  uMoved: number
  uFactors: Bins
  /** Analyses that have the figure now and had it not, and the other way round. */
  appeared: number
  vanished: number
}

/** The figure of a trial that moved by the greatest multiple of its URepeat. */
export interface GreatestMove {
  trialId: string
  /** As in `Moves.figures`. */
  figure: string
  before: number
  after: number
  multiple: number
}

/** How analyses made again differ from those they take the place of. */
export interface Moves {
  trials: number
  trialsMoved: number
  /** Trials that could not be analysed again, and keep the analysis they have. */
  failed: string[]
  /** By metric key; a foot's figure as `key/left`, `key/right`, the asymmetry as `key/asymmetry`. */
  figures: Record<string, FigureMoves>
  checks: { toFail: number; fromFail: number; other: number }
  /** Trials that moved, by session; `published` counts those that athletes read. */
  sessions: Record<string, { moved: number; published: number }>
  /** Greatest first; at most `keptMoves`. */
  greatest: GreatestMove[]
}

/**
 * Analyses of a club, a session or an athlete made again with what is in force, or (`dryRun`) only compared with what
 * is there. `state`: waiting, running, done, cancelled, failed.
 */
export const recomputes = club.table(
  'recomputes',
  {
    clubId: clubId().references(() => clubs.id),
    id: id(),
    /** 'club', or the one of the next two that is set. */
    scope: text('scope').notNull(),
    sessionId: uuid('session_id'),
    athleteId: uuid('athlete_id'),
    dryRun: boolean('dry_run').notNull(),
    state: text('state').notNull().default('waiting'),
    engineVersion: text('engine_version').notNull(),
    madeWith: jsonb('made_with').$type<MadeWith>().notNull(),
    /** Trials. */
    total: integer('total').notNull(),
    done: integer('done').notNull().default(0),
    /** What moved, of the batches that were added up so far. */
    moves: jsonb('moves').$type<Moves | null>(),
    requestedBy: uuid('requested_by').notNull(),
    createdAt: createdAt(),
    startedAt: moment('started_at'),
    finishedAt: moment('finished_at'),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.id] }),
    index('recomputes_made').on(t.clubId, t.createdAt),
    uniqueIndex('recomputes_open')
      .on(t.clubId)
      .where(sql`state in ('waiting', 'running')`),
    foreignKey({ columns: [t.clubId, t.sessionId], foreignColumns: [sessions.clubId, sessions.id] }),
    foreignKey({ columns: [t.clubId, t.athleteId], foreignColumns: [athletes.clubId, athletes.id] }),
    foreignKey({
      columns: [t.clubId, t.requestedBy],
      foreignColumns: [memberships.clubId, memberships.personId],
    }),
    ownClubPolicy('recomputes'),
    staffOnlyPolicy('recomputes'),
  ],
)

/** The trials of one job of a recompute. Done once, whoever takes it up: `doneAt` fences the second run. */
export const recomputeBatches = club.table(
  'recompute_batches',
  {
    clubId: clubId(),
    recomputeId: uuid('recompute_id').notNull(),
    /** From 0. */
    n: integer('n').notNull(),
    trialIds: uuid('trial_ids').array().notNull(),
    doneAt: moment('done_at'),
    /** What moved; null again once it is added to the whole. */
    moves: jsonb('moves').$type<Moves | null>(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.recomputeId, t.n] }),
    foreignKey({
      columns: [t.clubId, t.recomputeId],
      foreignColumns: [recomputes.clubId, recomputes.id],
    }),
    ownClubPolicy('recompute_batches'),
    staffOnlyPolicy('recompute_batches'),
  ],
)
