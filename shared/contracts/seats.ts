import { z } from 'zod'
import { endpoint } from './endpoint.ts'
import { Id, Moment } from './fields.ts'

export const SeatLine = z.strictObject({
  athleteId: Id,
  name: z.string(),
  /** `over`: holds a seat beyond those that are paid for. `cooling`: released, and taken until `freesAt`. */
  state: z.enum(['seated', 'over', 'waiting', 'cooling', 'none']),
  since: Moment.nullable(),
  freesAt: Moment.nullable(),
})
export type SeatLine = z.infer<typeof SeatLine>

export const SeatPlan = z.strictObject({
  paid: z.int(),
  /** Held or cooling. */
  used: z.int(),
  /** Whether a new or invited athlete gets a seat by themselves, or the next place on the waiting list. */
  byItself: z.boolean(),
  /** Of the rule. */
  version: z.int32().nonnegative(),
  /** Active athletes, and those whose seat cools. */
  athletes: z.array(SeatLine),
})
export type SeatPlan = z.infer<typeof SeatPlan>

const access = ['admin'] as const
const OfAthlete = z.strictObject({ athleteId: Id })

export const getSeatPlan = endpoint({
  method: 'GET',
  path: '/api/club/seats/plan',
  access,
  response: SeatPlan,
})
/** A seat, or where none is free the next place on the waiting list. */
export const giveSeat = endpoint({
  method: 'POST',
  path: '/api/club/seats/give',
  access,
  body: OfAthlete,
  response: SeatPlan,
})
/** Takes the seat, or the place on the waiting list. */
export const releaseSeat = endpoint({
  method: 'POST',
  path: '/api/club/seats/release',
  access,
  body: OfAthlete,
  response: SeatPlan,
})
export const changeSeatRule = endpoint({
  method: 'PATCH',
  path: '/api/club/seats/rule',
  access,
  body: z.strictObject({ byItself: z.boolean(), version: z.int32().nonnegative() }),
  response: SeatPlan,
})
