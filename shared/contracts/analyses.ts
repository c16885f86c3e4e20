import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { Id, Moment } from './fields.ts'
import { measuringRoles } from './roles.ts'

/** One analysis of a trial, in force or superseded. */
export const AnalysisEdition = z.strictObject({
  id: Id,
  madeAt: Moment,
  engineVersion: z.string(),
  current: z.boolean(),
  /** True of the one that the athlete reads. */
  published: z.boolean(),
  /** The engine's own settings, as `default-<version>`, and what the club had changed of them. */
  settings: z.string(),
  changedSettings: z.record(z.string(), z.union([z.number(), z.string()])),
  /** m/s² */
  gravity: z.number(),
  /** Expanded relative uncertainty (k = 2) of the plates by channel. */
  calibrationU: z.record(z.string(), z.number()),
  recordedMassKg: z.number().nullable(),
  movedEvents: z.array(z.string()),
  /** The figures that sheets carry, SI units of the catalogue. */
  figures: z.record(z.string(), z.strictObject({ value: z.number(), U: z.number().nullable() })),
  fails: z.int(),
})
export type AnalysisEdition = z.infer<typeof AnalysisEdition>

/** Every analysis of a trial, newest first. */
export const listAnalyses = endpoint({
  method: 'GET',
  path: '/api/trials/:trialId/analyses',
  access: measuringRoles,
  params: z.strictObject({ trialId: Id }),
  response: z.strictObject({ analyses: z.array(AnalysisEdition) }),
})
