import { z } from 'zod'
import { eventOrder } from '../mechanics/events/event-order.ts'
import { Moment } from './fields.ts'
import { limits } from './limits.ts'
import { Changed } from './measuring.ts'
import { Test } from './tests.ts'

export const EventName = z.enum(eventOrder)

/** Seconds from the trial's first sample, by event. */
export const MovedEvents = z.partialRecord(EventName, z.number())

export const MoveReason = z.string().trim().min(3, 'Say why').max(limits.reasonCharacters)

/** One time that a person moved events, or put them back. */
export const EventMove = z.strictObject({
  /** All that are moved from then on; empty: all back to automatic. */
  events: MovedEvents,
  /** Where those that this changed stood before; null where the trial had no such event. */
  stood: z.partialRecord(EventName, z.number().nullable()),
  reason: z.string().nullable(),
  byName: z.string(),
  at: Moment,
})
export type EventMove = z.infer<typeof EventMove>

/**
 * What the server would analyse a trial with now, but for moved events: the page runs the same engine with it while
 * an event is being moved.
 */
export const EngineInputs = z.strictObject({
  engineVersion: z.string(),
  test: Test,
  recordedMassKg: z.number().nullable(),
  gravity: z.number(),
  calibrationU: z.partialRecord(z.enum(['left', 'right', 'single', 'total']), z.number()),
  /** What the club changed of the engine's own settings. */
  changedSettings: Changed,
})
export type EngineInputs = z.infer<typeof EngineInputs>
