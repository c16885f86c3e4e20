import type { Settings } from '../settings.ts'
import type { Motion } from '../signal/motion.ts'
import { findPeak, readPeakAt, type Peak } from '../signal/peak.ts'
import type { AnalyseOptions, EventName } from '../types.ts'
import { fitFlank, type Crossing, type FlankDirection } from './flank.ts'
import { findStill } from './still.ts'
import type { TrialEvents } from './trial-events.ts'
import { fallStops } from './turning-points.ts'
import type { Zero, ZeroedSignal } from './zero.ts'

/** What every search for events goes by. */
export interface EventSearch {
  signal: ZeroedSignal
  zero: Zero
  moved: NonNullable<AnalyseOptions['movedEvents']>
  settings: Settings
}

/** A person's instant in place of the fitted one, as far as it lies in the record; it is sure to a sample. */
export function movedTo({ moved, signal }: EventSearch, name: EventName): number | null {
  const timeS = moved[name]
  if (timeS === undefined || !Number.isFinite(timeS)) return null
  return Math.max(0, Math.min(signal.length - 1, timeS * signal.sampleRateHz))
}

/** Standard uncertainty of an instant set by hand, samples: anywhere within one. */
export const movedU = 0.5 / Math.sqrt(3)

/** Where the force crosses the event force at an edge of an unloaded stretch, or where a person put it. */
export function placeCrossing(
  search: EventSearch,
  name: 'arrival' | 'takeoff' | 'touchdown',
  edge: number,
): Crossing | null {
  const { signal, zero, settings } = search
  const direction: FlankDirection = name === 'takeoff' ? 'falling' : 'rising'
  const found = fitFlank(signal.total, edge, direction, zero.total, signal.dt, settings)
  const position = movedTo(search, name)
  if (position === null) return found
  return { position, positionU: movedU, slope: found?.slope ?? (direction === 'falling' ? -1 : 1) }
}

/** Where the athlete stands still after a touchdown, or where a person put it. */
export function placeStill(search: EventSearch, weight: number, touchdown: Crossing): number | null {
  const { signal, settings } = search
  return movedTo(search, 'still') ?? findStill(signal.sums, weight, touchdown.position, signal.dt, settings)
}

/** The least or greatest force between two positions, or the force where a person put it. */
export function placePeak(
  search: EventSearch,
  name: 'minimumForce' | 'landingPeak',
  from: number,
  to: number,
): Peak {
  const { signal, zero, settings } = search
  const { total, dt } = signal
  const position = movedTo(search, name)
  if (position !== null) return readPeakAt(total, position, movedU, zero.total, dt, settings)
  return findPeak(total, from, to, name === 'landingPeak' ? 1 : -1, zero.total, dt, settings)
}

/** Where the fall is stopped, and the greatest force until then. */
export function placeLanding(
  search: EventSearch,
  motion: Motion,
  touchdown: Crossing,
  still: number | null,
): Pick<TrialEvents, 'landingPeak' | 'landingZeroVelocity' | 'still'> {
  const { signal, settings } = search
  const last = signal.length - 1
  const landingZeroVelocity =
    movedTo(search, 'landingZeroVelocity') ??
    fallStops(motion, touchdown.position, Math.floor(still ?? last), settings.closingFail)
  const end = landingZeroVelocity ?? Math.min(last, touchdown.position + settings.landingSearchS / signal.dt)
  return {
    landingPeak: placePeak(search, 'landingPeak', touchdown.position, end),
    landingZeroVelocity,
    still,
  }
}
