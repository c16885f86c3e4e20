import type { EventTime, Figure, Note, TrialAnalysis } from '../types.ts'
import { catalogue } from '../catalogue.ts'
import { jumpChecks, deadPlateCheck } from '../checks/jump-checks.ts'
import { feetChecks } from '../checks/feet-checks.ts'
import { recordingChecks, taredWithAthlete } from '../checks/recording-checks.ts'
import { weighingChecks } from '../checks/weighing-checks.ts'
import { locateJump, type JumpEvents } from '../events/jump-events.ts'
import type { Stretch, Unloaded } from '../events/unloaded.ts'
import { zeroPlates, type ZeroedSignal } from '../events/zero.ts'
import { ledgerOf } from '../ledger.ts'
import { eventTimes } from '../metrics/event-times.ts'
import { impulseFigures } from '../metrics/impulse.ts'
import { jumpFigures, takeoffVelocityOf } from '../metrics/jump.ts'
import { buildModel, type JumpModel } from '../metrics/jump-model.ts'
import { landingFigures } from '../metrics/landing.ts'
import type { Measured } from '../metrics/measured.ts'
import { pushFigures } from '../metrics/push.ts'
import { pushForceFigures } from '../metrics/push-forces.ts'
import { findFeet, lagFigures, sidesOf, type Foot } from '../metrics/sides.ts'
import { restToRestFigures, weighingFigures } from '../metrics/weighing.ts'
import type { NoTrial, TrialInput } from './protocol.ts'

/** The flight to analyse: the first one, or a takeoff after which the athlete did not come back in time. */
function chooseFlight(unloaded: Unloaded): { flight: Stretch; landed: boolean } | null {
  if (unloaded.flights.length > 0) return { flight: unloaded.flights[0], landed: true }
  const away = unloaded.offPlate.find(({ from }) => from > 0)
  return away ? { flight: away, landed: false } : null
}

/** First sample on the plates before the flight, clear of stepping on. */
function startOfStance(unloaded: Unloaded, flight: Stretch, dt: number): number {
  const before = unloaded.offPlate.filter(({ to }) => to <= flight.from)
  return before.length === 0 ? 0 : (before.at(-1) as Stretch).to + Math.round(0.1 / dt)
}

function eventTime(position: number | null | undefined, signal: ZeroedSignal): EventTime | null {
  if (position === null || position === undefined) return null
  return { timeS: position * signal.dt, sample: Math.round(position) }
}

function eventsOut(events: JumpEvents, signal: ZeroedSignal): TrialAnalysis['events'] {
  const positions = {
    onset: events.onset.position,
    minimumForce: events.minimumForce?.position,
    minimumVelocity: events.minimumVelocity?.position,
    zeroVelocity: events.zeroVelocity,
    takeoff: events.takeoff.position,
    touchdown: events.touchdown?.position,
    landingPeak: events.landingPeak?.position,
    landingZeroVelocity: events.landingZeroVelocity,
    still: events.still,
  }
  const placed = Object.entries(positions).flatMap(([name, position]) => {
    const time = eventTime(position, signal)
    return time ? [[name, time] as const] : []
  })
  return Object.fromEntries(placed)
}

function measureAll(model: JumpModel, feet: [Foot, Foot] | null): Measured {
  const into: Measured = new Map()
  const times = eventTimes(model)
  const takeoffVelocity = takeoffVelocityOf(model, times)
  weighingFigures(model, into)
  restToRestFigures(model, into)
  jumpFigures(model, times, takeoffVelocity, into)
  impulseFigures(model, takeoffVelocity, into)
  pushForceFigures(model, times, takeoffVelocity, into)
  pushFigures(model, times, takeoffVelocity, into)
  landingFigures(model, times, into)
  if (feet) lagFigures(model, feet, into)
  return into
}

/** Sorts outcomes into figures, what is missing, and notes on figures without uncertainty. */
function sortOut(model: JumpModel, outcomes: Measured) {
  const metrics: Record<string, Figure> = {}
  const missing: TrialAnalysis['missing'] = []
  const notes: Note[] = []
  for (const [key, outcome] of outcomes) {
    if ('missing' in outcome) missing.push({ key, reason: outcome.missing })
    else if (!Number.isFinite(outcome.quantity.value))
      missing.push({ key, reason: 'The trace gives no finite value for it.' })
    else {
      metrics[key] = model.budget.figure(outcome.quantity, outcome.withoutU !== undefined)
      if (outcome.withoutU !== undefined)
        notes.push({ code: 'no-uncertainty', sentence: `${catalogue[key].name}: ${outcome.withoutU}` })
    }
  }
  return { metrics, missing, notes }
}

/** Analyses a countermovement jump with its landing. */
export function analyseCmj(input: TrialInput): TrialAnalysis | NoTrial {
  const { recording, signal: recorded, unloaded, test, options, settings } = input
  const chosen = chooseFlight(unloaded)
  if (!chosen)
    return { code: 'no-trial-found', sentence: 'No takeoff was found: the plates were loaded all along.' }
  const { flight, landed } = chosen
  const tared = taredWithAthlete(unloaded)
  const { zero, signal } = zeroPlates(recorded, flight, settings)
  const located = locateJump({
    signal,
    zero,
    start: startOfStance(unloaded, flight, signal.dt),
    flight,
    landed,
    gravity: options.gravity,
    moved: options.movedEvents ?? {},
    settings,
  })
  if (!located)
    return {
      code: 'no-trial-found',
      sentence: 'No quiet stance and takeoff were found. Stand still, jump, and record all of it.',
    }
  const model = buildModel(signal, zero, located, test, options, settings)
  const feet = findFeet(model)
  const { metrics, missing, notes } = sortOut(model, measureAll(model, feet))
  const ledger = ledgerOf(model, metrics.closingBalance)
  const readings = {
    unloaded,
    heightImpulseM: metrics.jumpHeightImpulse.value,
    heightFlightM: metrics.jumpHeightFlight?.value ?? null,
    ledger,
  }
  if (tared)
    notes.push({
      code: 'tared-with-athlete',
      sentence: 'The plates were set to zero with the athlete on them; the flight gave the true zero.',
    })
  const dead = signal.plates.filter((plate) => plate.dead).map(({ channel }) => channel)
  return {
    test,
    startS: 0,
    endS: (signal.length - 1) * signal.dt,
    events: eventsOut(located.events, signal),
    metrics,
    sides: feet ? sidesOf(model, feet) : null,
    ledger,
    checks: [
      ...recordingChecks(recording, signal, unloaded, zero, settings),
      deadPlateCheck(dead),
      ...weighingChecks(model, options),
      ...(feet ? feetChecks(model, feet) : []),
      ...jumpChecks(model, readings),
    ],
    missing,
    notes,
  }
}
