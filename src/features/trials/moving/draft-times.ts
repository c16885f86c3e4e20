import { eventOrder, type MovedEvents } from '../../../../shared/mechanics/events/event-order.ts'
import type { EventName } from '../../../../shared/mechanics/types.ts'
import type { Analysis } from '../engine/analysis-of.ts'

/** Every event's time, seconds: where the person put it, or else where the engine finds it. */
export function timesOf({ events }: Pick<Analysis, 'events'>, draft: MovedEvents): MovedEvents {
  return Object.fromEntries(
    eventOrder.flatMap((name) => {
      const timeS = draft[name] ?? events[name]?.timeS
      return timeS === undefined ? [] : [[name, timeS]]
    }),
  )
}

interface Clock {
  sampleRateHz: number
  /** Time of the last sample. */
  endS: number
}

/** Whole samples between the event's neighbours in which it can be put, as times. */
export function boundsOf(name: EventName, times: MovedEvents, { sampleRateHz, endS }: Clock) {
  const there = eventOrder.filter((other) => times[other] !== undefined && other !== name)
  const at = eventOrder.indexOf(name)
  const before = there.findLast((other) => eventOrder.indexOf(other) < at)
  const after = there.find((other) => eventOrder.indexOf(other) > at)
  const last = Math.round(endS * sampleRateHz)
  const from = before === undefined ? 0 : Math.floor(times[before]! * sampleRateHz) + 1
  const to = after === undefined ? last : Math.ceil(times[after]! * sampleRateHz) - 1
  return { from: from / sampleRateHz, to: to / sampleRateHz }
}

/** The whole sample nearest to a time, within the event's bounds; null where there is none between its neighbours. */
export function placeWithin(name: EventName, timeS: number, times: MovedEvents, clock: Clock): number | null {
  const { from, to } = boundsOf(name, times, clock)
  if (from > to) return null
  const sample = Math.round(timeS * clock.sampleRateHz) / clock.sampleRateHz
  return Math.min(Math.max(sample, from), to)
}

/** So many samples on from an event that may stand between two: the first step goes to the next whole one. */
export function stepFrom(timeS: number, samples: number, { sampleRateHz }: Clock): number {
  const position = timeS * sampleRateHz
  const whole = samples > 0 ? Math.floor(position + 1e-6) : Math.ceil(position - 1e-6)
  return (whole + samples) / sampleRateHz
}

/** The draft without an event: back to where the engine finds it. */
export function withoutEvent(draft: MovedEvents, name: EventName): MovedEvents {
  const { [name]: _automatic, ...rest } = draft
  return rest
}

/** The events whose place the two differ in, in order. */
export function changedEvents(a: MovedEvents, b: MovedEvents): EventName[] {
  return eventOrder.filter((name) => a[name] !== b[name])
}
