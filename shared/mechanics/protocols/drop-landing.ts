import { dropHeight, noJump } from '../checks/drop-checks.ts'
import { deadPlates, feetChecks } from '../checks/feet-checks.ts'
import { landingLength, plausibleLanding } from '../checks/jump-checks.ts'
import { locateDropLanding, type DropSearch } from '../events/drop-events.ts'
import type { Stretch, Unloaded } from '../events/unloaded.ts'
import { trialTimes } from '../metrics/event-times.ts'
import { velocityAtEvent } from '../metrics/jump.ts'
import { landingFigures } from '../metrics/landing.ts'
import type { Measured } from '../metrics/measured.ts'
import { dropFigures } from '../metrics/rebound.ts'
import { findFeet, sidesOf, touchdownLag } from '../metrics/sides.ts'
import { buildModel } from '../metrics/trial-model.ts'
import { weighingFigures } from '../metrics/weighing.ts'
import { dropPhases } from '../phases.ts'
import type { AnalyseTrial } from './protocol.ts'
import { allUnloaded, searchRest } from './search-rest.ts'
import { trialOf } from './trial-of.ts'

/** The empty plates that the landing ends: the first with the athlete on the plates after them. */
function chooseFall(unloaded: Unloaded, length: number): Stretch | null {
  return allUnloaded(unloaded).find(({ to }) => to < length) ?? null
}

/** Landing from a box: the first touch, and then standing still. */
export const analyseDropLanding: AnalyseTrial = (input) => {
  const { unloaded, test, options, settings } = input
  const fall = chooseFall(unloaded, input.signal.length)
  const search: DropSearch | null = fall && {
    ...searchRest(input, fall),
    fall,
    unloaded: allUnloaded(unloaded),
  }
  const located = search && locateDropLanding(search)
  if (!fall || !located)
    return {
      code: 'no-trial-found',
      sentence:
        'No landing was found: the recording must begin with empty plates, on which the athlete lands.',
    }
  const model = buildModel(search.signal, search.zero, located, test, options, settings)
  const times = trialTimes(model)
  const measured: Measured = new Map()
  weighingFigures(model, measured)
  if (times.touchdown)
    dropFigures(model, velocityAtEvent(model, model.events.touchdown, times.touchdown), measured)
  landingFigures(model, times, measured)
  const feet = test.side === 'both' ? findFeet(model) : null
  if (feet) touchdownLag(model, feet, measured)
  const phases = dropPhases(model.events, fall.from)
  return trialOf(input, {
    model,
    measured,
    phases,
    sides: feet && sidesOf(model, feet, phases),
    checks: ({ metrics }) =>
      [
        ...(feet ? feetChecks(model, feet) : []),
        test.side === 'both' ? deadPlates(model) : null,
        noJump(unloaded.flights.filter(({ from }) => from >= fall.to).length),
        dropHeight(model, metrics.effectiveDropHeight),
        landingLength(model),
        plausibleLanding(model),
      ].filter((entry) => entry !== null),
  })
}
