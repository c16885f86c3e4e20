import { deadPlates, feetChecks } from '../checks/feet-checks.ts'
import { hopChecks } from '../checks/hop-checks.ts'
import { closing, landingLength, plausibleLanding } from '../checks/jump-checks.ts'
import { locateHops, type HopSearch } from '../events/hop-events.ts'
import type { Stretch } from '../events/unloaded.ts'
import { contactOut } from '../metrics/contacts.ts'
import { trialTimes } from '../metrics/event-times.ts'
import { hopFigures, measureHops } from '../metrics/hops.ts'
import { landingFigures } from '../metrics/landing.ts'
import type { Measured } from '../metrics/measured.ts'
import { findFeet, sidesOf, touchdownLag } from '../metrics/sides.ts'
import { buildModel } from '../metrics/trial-model.ts'
import { restToRestFigures, weighingFigures } from '../metrics/weighing.ts'
import { hopPhases, landingPhase } from '../phases.ts'
import type { AnalyseTrial, TrialInput } from './protocol.ts'
import { allUnloaded, searchRest } from './search-rest.ts'
import { trialOf } from './trial-of.ts'

/**
 * The flights of the series; without a stance before it, the empty plates from which the first contact was reached
 * stand for one.
 */
function seriesOf({ unloaded, signal, settings }: TrialInput): Stretch[] {
  const [first] = unloaded.flights
  const before = first && unloaded.offPlate.filter(({ to }) => to <= first.from).at(-1)
  const isContact = before && (first.from - before.to) * signal.dt <= settings.longestReboundS
  return isContact ? [before, ...unloaded.flights] : unloaded.flights
}

/** Repeated hops: a jump from stance, at least five short contacts, and a landing. */
export const analyseHops: AnalyseTrial = (input) => {
  const { unloaded, test, options, settings } = input
  const flights = seriesOf(input)
  if (flights.length < 2)
    return {
      code: 'no-trial-found',
      sentence: 'No hops were found: there is no contact between two flights.',
    }
  const before = unloaded.offPlate.filter(({ to }) => to <= flights[0].from).at(-1)
  const start = before ? before.to + Math.round(settings.stepOnS / input.signal.dt) : 0
  const search: HopSearch = {
    ...searchRest(input, flights[0]),
    start,
    flights,
    unloaded: allUnloaded(unloaded),
  }
  const located = locateHops(search)
  if (!located) return { code: 'no-trial-found', sentence: 'No contact between two flights could be placed.' }
  const model = buildModel(search.signal, search.zero, located, test, options, settings)
  const hops = measureHops(model, located.contacts)
  const measured: Measured = new Map()
  weighingFigures(model, measured)
  hopFigures(model, hops, measured)
  landingFigures(model, trialTimes(model), measured)
  restToRestFigures(model, measured)
  const feet = test.side === 'both' ? findFeet(model) : null
  if (feet) touchdownLag(model, feet, measured)
  return trialOf(input, {
    model,
    measured,
    phases: hopPhases(model.events, located.contacts),
    sides: feet && sidesOf(model, feet, landingPhase(model.events)),
    contacts: hops.map((hop) => contactOut(model, hop, hop.counted)),
    checks: ({ ledger }) =>
      [
        ...(feet ? feetChecks(model, feet) : []),
        test.side === 'both' ? deadPlates(model) : null,
        ...hopChecks(model, hops.length, hops.filter(({ counted }) => counted).length),
        landingLength(model, true),
        plausibleLanding(model),
        ledger && closing(model, { ledger }),
      ].filter((entry) => entry !== null),
  })
}
