import { feetChecks } from '../checks/feet-checks.ts'
import { jumpChecks } from '../checks/jump-checks.ts'
import { recordingChecks, taredWithAthlete } from '../checks/recording-checks.ts'
import { weighingChecks } from '../checks/weighing-checks.ts'
import { locateJump } from '../events/jump-events.ts'
import type { Stretch, Unloaded } from '../events/unloaded.ts'
import { zeroPlates } from '../events/zero.ts'
import { ledgerOf } from '../ledger.ts'
import { eventTimes, type EventTimes } from '../metrics/event-times.ts'
import { jumpFigures, takeoffVelocityOf } from '../metrics/jump.ts'
import { landingFigures } from '../metrics/landing.ts'
import type { Measured } from '../metrics/measured.ts'
import { findFeet, lagFigures, sidesOf, type Foot } from '../metrics/sides.ts'
import { buildModel, type JumpModel } from '../metrics/trial-model.ts'
import { restToRestFigures, weighingFigures } from '../metrics/weighing.ts'
import type { Note, TrialAnalysis, TrialCheck } from '../types.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import { phasesOf } from '../phases.ts'
import { eventsOut } from './events-out.ts'
import type { NoTrial, TrialInput } from './protocol.ts'
import { sortOut } from './sort-out.ts'

/** What makes one jump from stance another than the others. */
export interface JumpKind {
  /** Whether the body goes down first; without it the push begins at the onset. */
  dips: boolean
  /** Whether it is done on both feet, of which each has figures where there are two plates. */
  twoFeet: boolean
  /** Figures of the push beyond those of every jump. */
  measurePush: (model: JumpModel, times: EventTimes, takeoffVelocity: Quantity, into: Measured) => void
  /** Checks that only this jump has. */
  checks: (model: JumpModel, input: TrialInput) => TrialCheck[]
}

/** The flight to analyse: the first one, or a takeoff after which the athlete did not come back in time. */
function chooseFlight(unloaded: Unloaded): { flight: Stretch; landed: boolean } | null {
  if (unloaded.flights.length > 0) return { flight: unloaded.flights[0], landed: true }
  const away = unloaded.offPlate.find(({ from }) => from > 0)
  return away ? { flight: away, landed: false } : null
}

/** First sample on the plates before the flight, clear of stepping on. */
function startOfStance(unloaded: Unloaded, flight: Stretch, marginS: number, dt: number): number {
  const before = unloaded.offPlate.filter(({ to }) => to <= flight.from)
  return before.length === 0 ? 0 : (before.at(-1) as Stretch).to + Math.round(marginS / dt)
}

function measureAll(
  model: JumpModel,
  feet: [Foot, Foot] | null,
  measurePush: JumpKind['measurePush'],
): Measured {
  const into: Measured = new Map()
  const times = eventTimes(model)
  const takeoffVelocity = takeoffVelocityOf(model, times)
  weighingFigures(model, into)
  restToRestFigures(model, into)
  jumpFigures(model, times, takeoffVelocity, into)
  measurePush(model, times, takeoffVelocity, into)
  landingFigures(model, times, into)
  if (feet) lagFigures(model, feet, into)
  return into
}

const tared: Note = {
  code: 'tared-with-athlete',
  sentence: 'The plates were set to zero with the athlete on them; the flight gave the true zero.',
}

function locate(
  { unloaded, options, settings }: TrialInput,
  kind: JumpKind,
  zeroed: ReturnType<typeof zeroPlates>,
  flight: Stretch,
  landed: boolean,
) {
  const { signal, zero } = zeroed
  return locateJump({
    signal,
    zero,
    start: startOfStance(unloaded, flight, settings.stepOnS, signal.dt),
    flight,
    landed,
    dips: kind.dips,
    gravity: options.gravity,
    moved: options.movedEvents ?? {},
    settings,
  })
}

/** Analyses a jump from stance with its landing. */
export function analyseJump(input: TrialInput, kind: JumpKind): TrialAnalysis | NoTrial {
  const { recording, unloaded, test, options, settings } = input
  const chosen = chooseFlight(unloaded)
  if (!chosen)
    return { code: 'no-trial-found', sentence: 'No takeoff was found: the plates were loaded all along.' }
  const zeroed = zeroPlates(input.signal, chosen.flight, settings)
  const located = locate(input, kind, zeroed, chosen.flight, chosen.landed)
  if (!located)
    return {
      code: 'no-trial-found',
      sentence: 'No quiet stance and takeoff were found. Stand still, jump, and record all of it.',
    }
  const { signal, zero } = zeroed
  const model = buildModel(signal, zero, located, test, options, settings)
  const feet = kind.twoFeet ? findFeet(model) : null
  const { metrics, missing, notes } = sortOut(model.budget, measureAll(model, feet, kind.measurePush))
  const ledger = ledgerOf(model, phasesOf(model.events), metrics.closingBalance)
  const readings = {
    unloaded,
    heightImpulseM: metrics.jumpHeightImpulse.value,
    heightFlightM: metrics.jumpHeightFlight?.value ?? null,
    ledger,
    dips: kind.dips,
  }
  return {
    test,
    startS: 0,
    endS: (signal.length - 1) * signal.dt,
    events: eventsOut(located.events, signal.dt),
    metrics,
    sides: feet ? sidesOf(model, feet, phasesOf(model.events)) : null,
    ledger,
    checks: [
      ...recordingChecks(recording, signal, unloaded, zero, settings),
      ...weighingChecks(model, options),
      ...(feet ? feetChecks(model, feet) : []),
      ...kind.checks(model, input),
      ...jumpChecks(model, readings),
    ],
    missing,
    notes: taredWithAthlete(unloaded, settings) ? [...notes, tared] : notes,
  }
}
