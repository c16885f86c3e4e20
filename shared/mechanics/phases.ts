import type { Phase } from './types.ts'
import type { JumpEvents } from './events/jump-events.ts'

/** A phase between two positions in samples. */
export interface PhaseSpan {
  phase: Phase
  from: number
  to: number
}

/**
 * Phases of a countermovement jump from its events. Unweighting: onset to minimum velocity; braking: to zero velocity;
 * propulsion: to takeoff; flight: to touchdown; landing: to zero velocity; settling: to still. A phase whose events
 * were not found is left out; without a countermovement all of the push is propulsion.
 */
export function phasesOf(events: JumpEvents): PhaseSpan[] {
  const { onset, minimumVelocity, zeroVelocity, takeoff, touchdown, landingZeroVelocity, still } = events
  const spans: PhaseSpan[] = []
  let last = onset.position
  const add = (phase: Phase, to: number | undefined | null) => {
    if (to === undefined || to === null || !(to > last)) return
    spans.push({ phase, from: last, to })
    last = to
  }
  if (minimumVelocity && zeroVelocity !== null) {
    add('unweighting', minimumVelocity.position)
    add('braking', zeroVelocity)
  }
  add('propulsion', takeoff.position)
  if (!touchdown) return spans
  add('flight', touchdown.position)
  if (landingZeroVelocity === null) return spans
  add('landing', landingZeroVelocity)
  add('settling', still)
  return spans
}
