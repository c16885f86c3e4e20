import { dropHeight, oneRebound, plausibleRebound } from '../checks/drop-checks.ts'
import { deadPlates, feetChecks } from '../checks/feet-checks.ts'
import { heightAgreement, landedOnPlates, landingLength, plausibleLanding } from '../checks/jump-checks.ts'
import type { PlacedContact } from '../events/contacts.ts'
import { locateDropJump, type DropSearch, type Rebound, type ReboundEvents } from '../events/drop-events.ts'
import type { Stretch, Unloaded } from '../events/unloaded.ts'
import { contactOut, isRebound, measureContact, type MeasuredContact } from '../metrics/contacts.ts'
import { landingFigures } from '../metrics/landing.ts'
import { recorderDelay } from '../metrics/recorder-delay.ts'
import type { Measured } from '../metrics/measured.ts'
import { reboundFigures, reboundTimes, type ReboundModel, type ReboundTimes } from '../metrics/rebound.ts'
import { findFeet, lagFigures, sidesOf } from '../metrics/sides.ts'
import { buildModel } from '../metrics/trial-model.ts'
import { weighingFigures } from '../metrics/weighing.ts'
import { reboundPhases } from '../phases.ts'
import { findPeak } from '../signal/peak.ts'
import type { TrialAnalysis, TrialCheck } from '../types.ts'
import type { AnalyseTrial } from './protocol.ts'
import { allUnloaded, searchRest } from './search-rest.ts'
import { trialOf } from './trial-of.ts'

/** The fall that ends with the first touch, and the flight after the contact; `null` where either is not there. */
function chooseDrop(unloaded: Unloaded): ({ fall: Stretch } & Rebound) | null {
  const all = allUnloaded(unloaded)
  for (const [i, fall] of all.entries()) {
    const flight = all[i + 1]
    if (!flight) return null
    const landed = unloaded.flights.includes(flight)
    if (unloaded.offPlate.includes(fall)) return { fall, flight, landed }
  }
  return null
}

/** The contact between fall and flight; `null` where no flight after it was found to end. */
function placedContact({ signal, zero, settings }: DropSearch, events: ReboundEvents): PlacedContact | null {
  const { arrival, takeoff, touchdown } = events
  if (!touchdown) return null
  const { total, dt } = signal
  const peak = findPeak(total, arrival.position, takeoff.position, 1, zero.total, dt, settings)
  return { touchdown: arrival, takeoff, landing: touchdown, peak }
}

function contactOf(search: DropSearch, model: ReboundModel, times: ReboundTimes): MeasuredContact | null {
  const placed = placedContact(search, model.events)
  if (!placed || !times.touchdown) return null
  const recorder = recorderDelay(model)
  return measureContact(model, placed, times.arrival, times.takeoff, times.touchdown, recorder)
}

function checksOf(model: ReboundModel, flights: number, metrics: TrialAnalysis['metrics']): TrialCheck[] {
  const impulse = metrics.jumpHeightImpulse?.value ?? null
  const flight = metrics.jumpHeightFlight?.value ?? null
  return [
    model.test.side === 'both' ? deadPlates(model) : null,
    oneRebound(flights),
    plausibleRebound(model, metrics.contactTime.value, impulse ?? flight),
    dropHeight(model, metrics.effectiveDropHeight),
    // Without a weighing the velocity is that of the flight itself.
    impulse === null || !model.weighing
      ? null
      : heightAgreement(model, { heightImpulseM: impulse, heightFlightM: flight }),
    landedOnPlates(model),
    landingLength(model),
    plausibleLanding(model),
  ].filter((entry) => entry !== null)
}

/** Drop jump: off a box, a short contact, a jump, and a landing after which the athlete stands still. */
export const analyseDj: AnalyseTrial = (input) => {
  const { unloaded, test, options, settings } = input
  const chosen = chooseDrop(unloaded)
  if (!chosen)
    return {
      code: 'no-trial-found',
      sentence:
        'No drop jump was found: the recording must begin with empty plates, then comes the contact, then a flight.',
    }
  const { fall, flight, landed } = chosen
  const search: DropSearch = { ...searchRest(input, fall), fall, unloaded: allUnloaded(unloaded) }
  const located = locateDropJump(search, { flight, landed })
  if (!located)
    return { code: 'no-trial-found', sentence: 'No takeoff was found after the first touch of the plates.' }
  const model = buildModel(search.signal, search.zero, located, test, options, settings)
  const times = reboundTimes(model)
  const contact = contactOf(search, model, times)
  const measured: Measured = new Map()
  weighingFigures(model, measured)
  reboundFigures(model, times, contact, measured)
  landingFigures(model, times, measured)
  const feet = test.side === 'both' ? findFeet(model) : null
  if (feet) lagFigures(model, feet, measured)
  const phases = reboundPhases(model.events, fall.from)
  const flights = unloaded.flights.filter(({ from }) => from >= fall.to).length
  return trialOf(input, {
    model,
    measured,
    phases,
    sides: feet && sidesOf(model, feet, phases),
    contacts: contact ? [contactOut(model, contact, isRebound(model, contact))] : [],
    checks: ({ metrics }) => [...(feet ? feetChecks(model, feet) : []), ...checksOf(model, flights, metrics)],
  })
}
