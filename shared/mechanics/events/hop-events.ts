import { integrateAround } from '../signal/anchored-motion.ts'
import { placeContacts, type PlacedContact } from './contacts.ts'
import type { Crossing } from './flank.ts'
import { placeCrossing, placeLanding } from './landing-events.ts'
import { findOnset, type Onset } from './onset.ts'
import {
  endOfVisit,
  restAfter,
  unwindFromFlight,
  unwindFromRest,
  type Rest,
  type RestSearch,
  type Unwound,
} from './rest.ts'
import { noEvents, type TrialEvents } from './trial-events.ts'
import type { Stretch } from './unloaded.ts'
import { chooseWindow, weighIn, type Weighing, type WeighingWindow } from './weighing.ts'

/** Where a series of hops is to be looked for. */
export interface HopSearch extends RestSearch {
  /** First sample on the plates before the series. */
  start: number
  /** The flights of the series, in their order. */
  flights: readonly Stretch[]
  /** Every time off the plates. */
  unloaded: readonly Stretch[]
}

export interface LocatedHops extends Unwound {
  weighing: Weighing | null
  events: TrialEvents & { takeoff: Crossing; touchdown: Crossing }
  contacts: PlacedContact[]
}

interface Stance {
  chosen: WeighingWindow
  onset: Onset
}

/** The stance before the series, and where the movement begins; `null` where there is none. */
function stanceBefore(search: HopSearch): Stance | null {
  const { signal, zero, start, flights, settings } = search
  const { total, sums, dt } = signal
  const takeoff = flights[0].from
  const chosen = chooseWindow(total, sums, { from: start, to: takeoff }, dt, settings)
  if (!chosen || !(chosen.systemWeight > settings.smallestLoadN)) return null
  if (!(chosen.spread <= settings.steadinessFail * chosen.systemWeight)) return null
  const limits = { earliest: start, takeoff }
  const onset = findOnset(total, sums, chosen, limits, zero.total, dt, settings)
  return onset.fromQuiet && onset.position < takeoff ? { chosen, onset } : null
}

function weighBefore(
  { signal, zero, start, gravity, settings }: HopSearch,
  { chosen, onset }: Stance,
): Weighing {
  const limits = { from: start, to: Math.floor(onset.position) }
  return weighIn(chosen, signal.sums, limits, gravity, zero.total, signal.dt, settings)
}

/** Integrates backwards from the stance after the series, or else on from the one before it, or from its last flight. */
function unwind(
  search: HopSearch,
  { takeoff, landing }: PlacedContact,
  stance: Stance | null,
  weighing: Weighing | null,
  rest: Rest | null,
): Unwound {
  const { signal, gravity, flights, settings } = search
  const first = Math.floor(stance?.onset.position ?? flights[0].from)
  if (rest) return unwindFromRest(search, first, rest)
  if (!stance || !weighing) return unwindFromFlight(search, first, takeoff, landing)
  const anchor = { position: stance.onset.position, velocity: 0 }
  return {
    motion: integrateAround(signal.total, first, anchor, weighing.systemWeight, gravity, signal.dt),
    startVelocity: { value: 0, u: settings.swayVelocityChange / Math.SQRT2 },
  }
}

/** Places the contacts of a series of hops and what is before and after it; `null` where there is no contact. */
export function locateHops(search: HopSearch): LocatedHops | null {
  const { signal, zero, flights, unloaded, settings } = search
  const contacts = placeContacts(signal, zero, flights, settings)
  const takeoff = placeCrossing(search, 'takeoff', flights[0].from)
  const touchdown = placeCrossing(search, 'touchdown', flights[flights.length - 1].to)
  const final = contacts?.at(-1)
  if (!contacts || !final || !takeoff || !touchdown) return null
  const last = { ...final, landing: touchdown }
  const stance = stanceBefore(search)
  const to = endOfVisit(touchdown.position, unloaded, signal.length)
  const rest = restAfter(search, touchdown, { from: Math.ceil(touchdown.position), to })
  const weighing = rest?.weighing ?? (stance && weighBefore(search, stance))
  const unwound = unwind(search, last, stance, weighing, rest)
  return {
    ...unwound,
    weighing,
    events: {
      ...noEvents,
      onset: stance?.onset ?? null,
      takeoff,
      touchdown,
      ...placeLanding(search, unwound.motion, touchdown, rest?.still ?? null),
    },
    contacts: [...contacts.slice(0, -1), last],
  }
}
