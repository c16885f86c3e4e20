import type { TrialEvents } from '../events/trial-events.ts'
import type { EventName, TrialAnalysis } from '../types.ts'

/** The events that were found, in seconds and samples. */
export function eventsOut(events: TrialEvents, dt: number): TrialAnalysis['events'] {
  const positions: Record<EventName, number | null | undefined> = {
    onset: events.onset?.position,
    arrival: events.arrival?.position,
    minimumForce: events.minimumForce?.position,
    minimumVelocity: events.minimumVelocity?.position,
    zeroVelocity: events.zeroVelocity,
    takeoff: events.takeoff?.position,
    touchdown: events.touchdown?.position,
    landingPeak: events.landingPeak?.position,
    landingZeroVelocity: events.landingZeroVelocity,
    still: events.still,
  }
  const placed = Object.entries(positions).flatMap(([name, position]) =>
    position === null || position === undefined
      ? []
      : [[name, { timeS: position * dt, sample: Math.round(position) }] as const],
  )
  return Object.fromEntries(placed)
}
