import type { Trial } from './perform.ts'
import { greatest } from './search.ts'
import { contactEvents, trueTouchdown } from './true-events.ts'
import type { Figures } from './true-figures.ts'

/** Longer contacts do not count as rebounds (common practice, from memory). */
const LONGEST_COUNTED_S = 0.25
/** The best five of the first ten (Harper, Hobbs, Moore 2011). */
const BEST = { of: 10, count: 5 }

/** One contact and the flight after it. */
export interface TrueContact {
  touchdownS: number
  takeoffS: number
  contactTime: number
  flightTime: number
  /** From time in the air, g·t²/8. */
  height: number
  /** Height over contact time, m/s. */
  rsi: number
  rsiFlightContact: number
  peakForce: number
  counted: boolean
}

/** The contact that begins at `touchS`, and flight `after`, counted from 0. */
export function trueContact(trial: Trial, touchS: number, after: number): TrueContact {
  const flight = trial.marks.flights[after]
  if (!flight) throw new RangeError('A contact has a flight after it.')
  const { touchdown, takeoff } = contactEvents(trial, touchS, flight)
  const contactTime = takeoff - touchdown
  const flightTime = trueTouchdown(trial, flight.toS) - takeoff
  const height = (trial.athlete.gravity * flightTime ** 2) / 8
  return {
    touchdownS: touchdown,
    takeoffS: takeoff,
    contactTime,
    flightTime,
    height,
    rsi: height / contactTime,
    rsiFlightContact: flightTime / contactTime,
    peakForce: greatest(trial.force, touchdown, takeoff).value,
    counted: contactTime <= LONGEST_COUNTED_S,
  }
}

/** The contacts of a series of hops; the jump that starts it is none. */
export const trueHops = (trial: Trial): TrueContact[] =>
  trial.marks.flights.slice(0, -1).map(({ toS }, i) => trueContact(trial, toS, i + 1))

const mean = (values: number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length

export function hopsFigures(contacts: readonly TrueContact[]): Figures {
  const counted = contacts.slice(0, BEST.of).filter((contact) => contact.counted)
  const best = counted.map(({ rsi }) => rsi).sort((a, b) => b - a)
  return {
    hopCount: contacts.length,
    contactTimeMean: mean(counted.map(({ contactTime }) => contactTime)),
    ...(best.length >= BEST.count ? { rsiBestFive: mean(best.slice(0, BEST.count)) } : {}),
  }
}
