import type { Peak } from '../signal/peak.ts'
import type { Crossing } from './flank.ts'
import type { Onset } from './onset.ts'
import type { Placed } from './turning-points.ts'

/** The events of a trial, in samples; `null` where its test or its record does not hold one. */
export interface TrialEvents {
  onset: Onset | null
  arrival: Crossing | null
  minimumForce: Peak | null
  minimumVelocity: Placed | null
  zeroVelocity: number | null
  takeoff: Crossing | null
  touchdown: Crossing | null
  landingPeak: Peak | null
  landingZeroVelocity: number | null
  still: number | null
}

export const noEvents: TrialEvents = {
  onset: null,
  arrival: null,
  minimumForce: null,
  minimumVelocity: null,
  zeroVelocity: null,
  takeoff: null,
  touchdown: null,
  landingPeak: null,
  landingZeroVelocity: null,
  still: null,
}
