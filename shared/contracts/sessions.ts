import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { Id, IsoDate, Moment, Version } from './fields.ts'
import { limits } from './limits.ts'
import { MeanFigure } from './results.ts'
import { measuringRoles } from './roles.ts'
import { SessionTest } from './session-test.ts'
import { Test } from './tests.ts'
import { Upload } from './uploads.ts'

export const SessionSummary = z.strictObject({
  id: Id,
  date: IsoDate,
  title: z.string(),
  place: z.string().nullable(),
  /** What its recordings are read as; a trial may have been put to another. */
  test: Test,
  squadNames: z.array(z.string()),
  athletes: z.number().int(),
  trials: z.number().int(),
  inTray: z.number().int(),
  publishedAt: Moment.nullable(),
  version: Version,
})
export type SessionSummary = z.infer<typeof SessionSummary>

export const listSessions = endpoint({
  method: 'GET',
  path: '/api/sessions',
  access: measuringRoles,
  query: z.strictObject({
    search: z.string().max(100).optional(),
    squadId: Id.optional(),
    page: z.coerce.number().int().min(1).default(1),
  }),
  response: z.strictObject({
    sessions: z.array(SessionSummary),
    page: z.number().int(),
    pages: z.number().int(),
    total: z.number().int(),
  }),
})

export const SessionForm = z.strictObject({
  date: IsoDate,
  title: z.string().trim().min(1, 'Give the session a title').max(limits.titleCharacters),
  place: z.string().trim().max(limits.nameCharacters).nullable(),
  note: z.string().trim().max(limits.noteCharacters).nullable(),
  test: SessionTest,
  squadIds: z.array(Id).min(1, 'Choose at least one squad'),
})
export const createSession = endpoint({
  method: 'POST',
  path: '/api/sessions',
  access: measuringRoles,
  body: SessionForm,
  response: SessionSummary,
})
const SessionParams = z.strictObject({ sessionId: Id })
/** Another test puts those of its trials to it that have the session's own, and analyses them anew. */
export const changeSession = endpoint({
  method: 'PATCH',
  path: '/api/sessions/:sessionId',
  access: measuringRoles,
  params: SessionParams,
  body: SessionForm.partial().extend({ version: Version }),
  response: SessionSummary,
})

/** A trial as a cell of the sheet: enough to judge it without opening it. */
export const SheetTrial = z.strictObject({
  id: Id,
  uploadId: Id,
  fileName: z.string(),
  athleteId: Id.nullable(),
  assignedBy: z.enum(['file-name', 'hand']).nullable(),
  test: Test,
  setAside: z.strictObject({ reason: z.string(), byName: z.string() }).nullable(),
  /** Total force, whole newtons, evenly spread over the trial. */
  preview: z.array(z.number()),
  /** null until analysed. */
  analysis: z
    .strictObject({
      id: Id,
      /** The figures that a sheet shows, by metric key; a metric that a failed check takes away is listed in `withheld`. */
      metrics: z.record(z.string(), z.strictObject({ value: z.number(), U: z.number().nullable() })),
      withheld: z.array(z.string()),
      cautions: z.number().int(),
      fails: z.number().int(),
      /** The first failed check's sentence, else the first caution's. */
      worstSentence: z.string().nullable(),
    })
    .nullable(),
  version: Version,
})
export type SheetTrial = z.infer<typeof SheetTrial>

export const SheetAthlete = z.strictObject({
  athleteId: Id,
  name: z.string(),
  means: z.record(z.string(), MeanFigure),
})

/** The Session sheet: every athlete of the session, every trial, the Tray, every upload. */
export const SessionSheet = z.strictObject({
  session: SessionSummary.extend({
    note: z.string().nullable(),
    squadIds: z.array(Id),
    publishedByName: z.string().nullable(),
  }),
  athletes: z.array(SheetAthlete),
  trials: z.array(SheetTrial),
  uploads: z.array(Upload),
  /** True where publishing again would change what athletes read. */
  changedSincePublished: z.boolean(),
})
export type SessionSheet = z.infer<typeof SessionSheet>

export const getSession = endpoint({
  method: 'GET',
  path: '/api/sessions/:sessionId',
  access: measuringRoles,
  params: SessionParams,
  response: SessionSheet,
})

/** Pins the included trials with their analyses; athletes read those until the next publication. */
export const publishSession = endpoint({
  method: 'POST',
  path: '/api/sessions/:sessionId/publish',
  access: measuringRoles,
  params: SessionParams,
  body: z.strictObject({ version: Version }),
  response: SessionSummary.extend({ athletesPublished: z.number().int(), trialsPublished: z.number().int() }),
})
