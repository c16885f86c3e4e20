import type { EventName } from '../types.ts'

/** The events of a trial in the order in which they come. */
export const eventOrder = [
  'onset',
  'arrival',
  'minimumForce',
  'minimumVelocity',
  'zeroVelocity',
  'takeoff',
  'touchdown',
  'landingPeak',
  'landingZeroVelocity',
  'still',
] as const satisfies readonly EventName[]

/** Instants that a person set in place of the engine's, seconds from the recording's first sample. */
export type MovedEvents = Partial<Record<EventName, number>>

/** What is wrong with a moved event. */
export type Misplaced =
  /** It lies outside the recording, which lasts from 0 to `endS`. */
  | { event: EventName; problem: 'outside'; endS: number }
  /** It must come after, or before, the other event, which stands at `otherS`. */
  | { event: EventName; problem: 'not-after' | 'not-before'; other: EventName; otherS: number }

/**
 * The first moved event that cannot stand where it was put: outside the recording, or out of order with the other
 * moved events and with those of the engine that stand; null where all can.
 * @param standing the trial's events as they stand, seconds; those in `moved` are replaced
 */
export function findMisplaced(moved: MovedEvents, standing: MovedEvents, endS: number): Misplaced | null {
  const merged = { ...standing, ...moved }
  const there = eventOrder.filter((name) => merged[name] !== undefined)
  const timeOf = (name: EventName) => merged[name] as number
  const outside = there.find((name) => name in moved && !(timeOf(name) >= 0 && timeOf(name) <= endS))
  if (outside) return { event: outside, problem: 'outside', endS }
  for (const [i, name] of there.entries()) {
    const before = there[i - 1]
    if (before === undefined || timeOf(before) < timeOf(name)) continue
    if (name in moved) return { event: name, problem: 'not-after', other: before, otherS: timeOf(before) }
    if (before in moved) return { event: before, problem: 'not-before', other: name, otherS: timeOf(name) }
  }
  return null
}
