import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { Id, IsoDate, Moment } from './fields.ts'
import { staffRoles } from './roles.ts'

/** Whose analyses: the whole club's, a session's or an athlete's. */
export const Scope = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('club') }),
  z.strictObject({ kind: z.literal('session'), sessionId: Id }),
  z.strictObject({ kind: z.literal('athlete'), athleteId: Id }),
])
export type Scope = z.infer<typeof Scope>

/** Both absent: the whole club. */
const ScopeQuery = z.strictObject({ sessionId: Id.optional(), athleteId: Id.optional() })

export const RecomputeState = z.enum(['waiting', 'running', 'done', 'cancelled', 'failed'])
export type RecomputeState = z.infer<typeof RecomputeState>

export const Recompute = z.strictObject({
  id: Id,
  scope: Scope,
  /** The session's title or the athlete's name; null of the whole club. */
  scopeName: z.string().nullable(),
  /** Compares only, and stores nothing. */
  dryRun: z.boolean(),
  state: RecomputeState,
  /** Trials. */
  total: z.int(),
  done: z.int(),
  engineVersion: z.string(),
  requestedByName: z.string(),
  requestedAt: Moment,
  finishedAt: Moment.nullable(),
})
export type Recompute = z.infer<typeof Recompute>

/** Of both feet together, of one foot, or the asymmetry between them. */
export const FigureOf = z.enum(['both', 'left', 'right', 'asymmetry'])
export type FigureOf = z.infer<typeof FigureOf>

/** What moved of one figure; values in the catalogue's SI unit, asymmetries in percent. */
export const FigureMove = z.strictObject({
  metric: z.string(),
  of: FigureOf,
  /** Trials in which the value is another. */
  moved: z.int(),
  /** Size; right to 1 %. null where none moved. */
  medianChange: z.number().nullable(),
  /** With its sign. */
  greatestChange: z.number().nullable(),
  /** In multiples of the figure's own give or take that comparisons use (URepeat), where there is one. */
  medianMultiple: z.number().nullable(),
  greatestMultiple: z.number().nullable(),
  /** Trials in which the give or take is another, and by what factor in the median. */
  uMoved: z.int(),
  medianUFactor: z.number().nullable(),
  appeared: z.int(),
  vanished: z.int(),
})
export type FigureMove = z.infer<typeof FigureMove>

export const RecomputeReport = z.strictObject({
  /** Compared so far. */
  trials: z.int(),
  trialsMoved: z.int(),
  /** Could not be analysed again, and keep the analysis they have. */
  trialsFailed: z.int(),
  figures: z.array(FigureMove),
  checks: z.strictObject({ toFail: z.int(), fromFail: z.int(), other: z.int() }),
  /** Published sessions that hold trials that moved: athletes go on reading what was published. */
  publishedSessions: z.array(z.strictObject({ id: Id, title: z.string(), date: IsoDate, trials: z.int() })),
  greatest: z.array(
    z.strictObject({
      trialId: Id,
      athleteName: z.string().nullable(),
      sessionTitle: z.string(),
      sessionDate: IsoDate,
      metric: z.string(),
      of: FigureOf,
      before: z.number(),
      after: z.number(),
      multiple: z.number(),
    }),
  ),
})
export type RecomputeReport = z.infer<typeof RecomputeReport>

/** How many of the analyses in force were made with something else than would be taken now. */
export const getStanding = endpoint({
  method: 'GET',
  path: '/api/analyses/standing',
  access: staffRoles,
  query: ScopeQuery,
  response: z.strictObject({
    engineVersion: z.string(),
    total: z.int(),
    /** Made with any of the next three. */
    stale: z.int(),
    otherEngine: z.int(),
    otherSettings: z.int(),
    otherPlates: z.int(),
    /** The club's recompute that waits or runs, whatever its scope. */
    open: Recompute.nullable(),
  }),
})

/** Newest first, at most 50. Of a session or athlete: those of that scope. */
export const listRecomputes = endpoint({
  method: 'GET',
  path: '/api/recomputes',
  access: staffRoles,
  query: ScopeQuery,
  response: z.strictObject({ recomputes: z.array(Recompute) }),
})

const RecomputeParams = z.strictObject({ recomputeId: Id })

export const getRecompute = endpoint({
  method: 'GET',
  path: '/api/recomputes/:recomputeId',
  access: staffRoles,
  params: RecomputeParams,
  /** `report` is null until the first part of it is there. */
  response: z.strictObject({ recompute: Recompute, report: RecomputeReport.nullable() }),
})

/** One at a time in a club; refused where every analysis was made with what is in force. */
export const startRecompute = endpoint({
  method: 'POST',
  path: '/api/recomputes',
  access: ['admin', 'coach'],
  body: z.strictObject({ scope: Scope, dryRun: z.boolean() }),
  response: Recompute,
})

/** What is under way ends, nothing more begins; what was made stays. Answers with how it stands. */
export const cancelRecompute = endpoint({
  method: 'POST',
  path: '/api/recomputes/:recomputeId/cancel',
  access: ['admin', 'coach'],
  params: RecomputeParams,
  response: Recompute,
})
