import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { Id, IsoDate, Version } from './fields.ts'
import { limits } from './limits.ts'
import { EngineInputs, EventMove, EventName, MovedEvents, MoveReason } from './moved-events.ts'
import { measuringRoles } from './roles.ts'
import { Test } from './tests.ts'

const Figure = z.strictObject({
  value: z.number(),
  U: z.number().nullable(),
  k: z.number(),
  URepeat: z.number().nullable(),
  kRepeat: z.number(),
})
const AsymmetryFigure = Figure.extend({
  larger: z.enum(['left', 'right']),
  zeroWithin: z.boolean().nullable(),
})
/** One contact between two flights, or between a drop and a flight. Seconds from the first sample; figures in SI units. */
const Contact = z.strictObject({
  touchdownS: z.number(),
  takeoffS: z.number(),
  contactTime: Figure,
  flightTime: Figure,
  height: Figure,
  rsi: Figure,
  rsiFlightContact: Figure,
  peakForce: Figure,
  /** Whether it is taken into the figure of the series. */
  counted: z.boolean(),
})
const Phase = z.enum([
  'arrival',
  'unweighting',
  'braking',
  'propulsion',
  'contact',
  'flight',
  'landing',
  'settling',
])
const MetricGroup = z.enum([
  'weighing',
  'jump',
  'impulse',
  'push',
  'contact',
  'flight',
  'landing',
  'sides',
  'ledger',
])

export const Analysis = z.strictObject({
  id: Id,
  engineVersion: z.string(),
  gravity: z.number(),
  events: z.partialRecord(EventName, z.strictObject({ timeS: z.number(), sample: z.number().int() })),
  /** Of a drop jump or of hops; null where the test has none. */
  contacts: z.array(Contact).nullable(),
  /** Of these events, those that a person set, as they set them. */
  movedEvents: MovedEvents,
  metrics: z.record(z.string(), Figure),
  /** Metric keys that a failed check takes away: shown struck, never averaged. */
  withheld: z.array(z.string()),
  sides: z
    .strictObject({
      left: z.record(z.string(), Figure),
      right: z.record(z.string(), Figure),
      asymmetry: z.record(z.string(), AsymmetryFigure),
    })
    .nullable(),
  ledger: z
    .strictObject({
      entries: z.array(
        z.strictObject({
          phase: Phase,
          startS: z.number(),
          endS: z.number(),
          netImpulse: z.number(),
          deltaVelocity: z.number(),
          balance: z.number(),
        }),
      ),
      closing: z.strictObject({
        value: z.number(),
        U: z.number().nullable(),
        closes: z.boolean().nullable(),
      }),
    })
    .nullable(),
  checks: z.array(
    z.strictObject({
      key: z.string(),
      verdict: z.enum(['pass', 'caution', 'fail']),
      affects: z.array(MetricGroup),
      measured: z.number().nullable(),
      limit: z.number().nullable(),
      unit: z.string(),
      sentence: z.string(),
      remedy: z.string(),
    }),
  ),
  missing: z.array(z.strictObject({ key: z.string(), reason: z.string() })),
  notes: z.array(z.strictObject({ code: z.string(), sentence: z.string() })),
})
export type Analysis = z.infer<typeof Analysis>

export const Trial = z.strictObject({
  id: Id,
  sessionId: Id,
  sessionTitle: z.string(),
  sessionDate: IsoDate,
  place: z.string().nullable(),
  uploadId: Id,
  /** null for an athlete: a file's name is the club's affair, and may name others. */
  fileName: z.string().nullable(),
  athlete: z.strictObject({ id: Id, name: z.string() }).nullable(),
  /** Of this athlete's trials in the session, from 1; null in the Tray. */
  placeInSession: z.strictObject({ n: z.number().int(), of: z.number().int() }).nullable(),
  test: Test,
  setAside: z.strictObject({ reason: z.string(), byName: z.string() }).nullable(),
  recording: z.strictObject({
    sampleRateHz: z.number(),
    sampleCount: z.number().int(),
    channels: z.array(z.enum(['left', 'right', 'single', 'total'])),
    filledSamples: z.number().int(),
    timeBaseError: z.number(),
  }),
  analysis: Analysis.nullable(),
  /** Neighbours on the sheet, for previous and next. */
  previousTrialId: Id.nullable(),
  nextTrialId: Id.nullable(),
  /** False for an athlete looking at their own published trial. */
  mayEdit: z.boolean(),
  /** Every time that events were moved or put back, newest first: the first one holds. None for an athlete. */
  eventMoves: z.array(EventMove),
  /** For whoever may move this trial's events; null for everybody else. */
  engineInputs: EngineInputs.nullable(),
  version: Version,
})
export type Trial = z.infer<typeof Trial>

const TrialParams = z.strictObject({ trialId: Id })

/** An athlete gets their own published trials, with the pinned analysis; of anyone else's the answer is 404. */
export const getTrial = endpoint({
  method: 'GET',
  path: '/api/trials/:trialId',
  access: ['coach', 'physio', 'athlete'],
  params: TrialParams,
  response: Trial,
})
/** Binary: little-endian int32 millinewtons, channel after channel in the order of `recording.channels`. */
export const getSamples = endpoint({
  method: 'GET',
  path: '/api/trials/:trialId/samples',
  access: ['coach', 'physio', 'athlete'],
  params: TrialParams,
  response: z.unknown(),
})
/** Puts the trial on an athlete of the session (null: back to the Tray), sets it aside with a reason, or takes it back. */
export const changeTrial = endpoint({
  method: 'PATCH',
  path: '/api/trials/:trialId',
  access: measuringRoles,
  params: TrialParams,
  body: z.strictObject({
    version: Version,
    athleteId: Id.nullable().optional(),
    setAsideReason: z.string().trim().min(3, 'Say why').max(limits.reasonCharacters).nullable().optional(),
  }),
  response: Trial,
})

/**
 * Sets which events stand where a person put them, in place of all that were moved before: none puts all back to
 * automatic. The trial is then analysed anew. A coach may, and a physio in a session of their own.
 */
export const moveEvents = endpoint({
  method: 'PUT',
  path: '/api/trials/:trialId/moved-events',
  access: measuringRoles,
  params: TrialParams,
  body: z
    .strictObject({
      version: Version,
      /** Of the engine that showed the person what the move does. */
      engineVersion: z.string().max(40),
      events: MovedEvents,
      reason: MoveReason.nullable(),
    })
    .refine(({ events, reason }) => reason !== null || Object.keys(events).length === 0, {
      path: ['reason'],
      error: 'Say why',
    }),
  response: Trial,
})
