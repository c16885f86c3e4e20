import type { Phase } from './types.ts'
import type { PlacedContact } from './events/contacts.ts'
import type { DropLandingEvents, ReboundEvents } from './events/drop-events.ts'
import type { JumpEvents } from './events/jump-events.ts'
import type { TrialEvents } from './events/trial-events.ts'

/** A phase between two positions in samples. */
export interface PhaseSpan {
  phase: Phase
  from: number
  to: number
}

/** A phase and where it ends; `null` where that was not found. */
type PhaseEnd = readonly [phase: Phase, to: number | null | undefined]

/** Lays phases end to end. One whose end was not found, or does not come after its beginning, is left out. */
function layFrom(start: number, ends: readonly PhaseEnd[]): PhaseSpan[] {
  const spans: PhaseSpan[] = []
  let last = start
  for (const [phase, to] of ends) {
    if (to === undefined || to === null || !(to > last)) continue
    spans.push({ phase, from: last, to })
    last = to
  }
  return spans
}

/** Flight, landing and settling; after what was not found there is nothing more. */
function landingEnds({ touchdown, landingZeroVelocity, still }: TrialEvents, flown: boolean): PhaseEnd[] {
  if (!touchdown) return []
  const flight: PhaseEnd[] = flown ? [['flight', touchdown.position]] : []
  if (landingZeroVelocity === null) return flight
  return [...flight, ['landing', landingZeroVelocity], ['settling', still]]
}

/**
 * Phases of a jump from stance by its events. Unweighting: onset to minimum velocity; braking: to zero velocity;
 * propulsion: to takeoff; flight: to touchdown; landing: to zero velocity; settling: to still. A phase whose events
 * were not found is left out; without a countermovement all of the push is propulsion.
 */
export function phasesOf(events: JumpEvents): PhaseSpan[] {
  const { onset, minimumVelocity, zeroVelocity, takeoff } = events
  const dip: PhaseEnd[] =
    minimumVelocity && zeroVelocity !== null
      ? [
          ['unweighting', minimumVelocity.position],
          ['braking', zeroVelocity],
        ]
      : []
  return layFrom(onset.position, [...dip, ['propulsion', takeoff.position], ...landingEnds(events, true)])
}

/** Phases of a drop jump; the fall begins with the empty plates. Without a deepest point the contact is one phase. */
export function reboundPhases(events: ReboundEvents, fallFrom: number): PhaseSpan[] {
  const { arrival, zeroVelocity, takeoff } = events
  const contact: PhaseEnd[] =
    zeroVelocity === null
      ? [['contact', takeoff.position]]
      : [
          ['braking', zeroVelocity],
          ['propulsion', takeoff.position],
        ]
  return layFrom(fallFrom, [['arrival', arrival.position], ...contact, ...landingEnds(events, true)])
}

/** Phases of a landing from a box: the fall, the landing, and settling. */
export function dropPhases(events: DropLandingEvents, fallFrom: number): PhaseSpan[] {
  return layFrom(fallFrom, [['arrival', events.touchdown.position], ...landingEnds(events, false)])
}

/**
 * Each contact of a series of hops and each flight, from the onset to where the athlete stands still again; none
 * without an onset.
 */
export function hopPhases(
  { onset, takeoff, still }: TrialEvents,
  contacts: readonly PlacedContact[],
): PhaseSpan[] {
  if (!onset) return []
  const between = contacts.flatMap(({ touchdown, takeoff: leaves }): PhaseEnd[] => [
    ['flight', touchdown.position],
    ['contact', leaves.position],
  ])
  return layFrom(onset.position, [
    ['contact', takeoff?.position],
    ...between,
    ['flight', contacts.at(-1)?.landing.position],
    ['contact', still],
  ])
}

/** The landing alone, where the fall is stopped. */
export function landingPhase({ touchdown, landingZeroVelocity }: TrialEvents): PhaseSpan[] {
  return touchdown ? layFrom(touchdown.position, [['landing', landingZeroVelocity]]) : []
}
