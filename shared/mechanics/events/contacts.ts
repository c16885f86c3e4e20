import type { Settings } from '../settings.ts'
import { findPeak, type Peak } from '../signal/peak.ts'
import { fitFlank, type Crossing, type FlankDirection } from './flank.ts'
import type { Stretch } from './unloaded.ts'
import type { Zero, ZeroedSignal } from './zero.ts'

/** A contact and the flight after it, placed between samples. */
export interface PlacedContact {
  touchdown: Crossing
  takeoff: Crossing
  /** Where the flight after it ends. */
  landing: Crossing
  /** Greatest force from touchdown to takeoff. */
  peak: Peak
}

/**
 * The contacts between unloaded stretches that follow one another: of the fall from a box and the flight, or of the
 * flights of a series of hops. Every crossing is placed once. `null` where one of them leaves the record.
 */
export function placeContacts(
  signal: ZeroedSignal,
  zero: Zero,
  unloaded: readonly Stretch[],
  settings: Settings,
): PlacedContact[] | null {
  const { total, dt } = signal
  const place = (edge: number, direction: FlankDirection) =>
    fitFlank(total, edge, direction, zero.total, dt, settings)
  const touchdowns = unloaded.map(({ to }) => place(to, 'rising'))
  const takeoffs = unloaded.slice(1).map(({ from }) => place(from, 'falling'))
  const contacts: PlacedContact[] = []
  for (let i = 0; i < takeoffs.length; i++) {
    const [touchdown, takeoff, landing] = [touchdowns[i], takeoffs[i], touchdowns[i + 1]]
    if (!touchdown || !takeoff || !landing) return null
    const peak = findPeak(total, touchdown.position, takeoff.position, 1, zero.total, dt, settings)
    contacts.push({ touchdown, takeoff, landing, peak })
  }
  return contacts
}
