import type { Trial } from './perform.ts'
import { hopsFigures, trueContact, trueHops } from './true-contacts.ts'
import type { TrueContact } from './true-contacts.ts'
import { contactEvents, landingEvents, pushEvents, trueOnset, trueTakeoff } from './true-events.ts'
import type { ContactEvents, LandingEvents, PushEvents } from './true-events.ts'
import {
  dropFigures,
  flightFigures,
  gained,
  landingFigures,
  pushFigures,
  reboundFigures,
  squatFigures,
  startFigures,
  weighingFigures,
} from './true-figures.ts'
import type { Figures } from './true-figures.ts'

/** `arrival` is the first touch after a drop that goes on with a jump. */
export type TrueEvents = Partial<PushEvents & ContactEvents & LandingEvents & { arrival: number }>

/** What a perfect engine would say of a trial: instants, figures in SI units by metric key, contacts, ledger. */
export interface Truth {
  events: TrueEvents
  metrics: Figures
  contacts: TrueContact[]
  /** Net impulses in N·s from rest to rest. */
  ledger: { phase: string; startS: number; endS: number; netImpulse: number }[]
}

type Mark = readonly [phase: string, startS: number]

/** Each phase goes on to the next, the last to rest. */
function ledgerOf(trial: Trial, marks: readonly Mark[]): Truth['ledger'] {
  return marks.map(([phase, startS], i) => {
    const endS = marks[i + 1]?.[1] ?? trial.marks.restS
    return { phase, startS, endS, netImpulse: gained(trial, startS, endS) }
  })
}

const landingMarks = ({ touchdown, landingZeroVelocity }: LandingEvents): Mark[] => [
  ['landing', touchdown],
  ['settling', landingZeroVelocity],
]

/** The landing's figures, unless the athlete left the plates in it. */
function landed(trial: Trial, events: LandingEvents): Figures {
  const stays = trial.stepOffS === null || trial.stepOffS > events.landingZeroVelocity
  return stays ? landingFigures(trial, events) : {}
}

const firstFlight = ({ marks }: Trial) => {
  const [flight] = marks.flights
  if (!flight) throw new RangeError('A jump has a flight.')
  return flight
}

function countermovementTruth(trial: Trial): Truth {
  const push = pushEvents(trial, firstFlight(trial))
  const landing = landingEvents(trial)
  const { onset, takeoff } = push
  const flight = flightFigures(trial, takeoff, landing.touchdown)
  const { displacement } = trial.motion
  const lift = displacement(takeoff) - displacement(onset)
  return {
    events: { ...push, ...landing },
    metrics: {
      ...weighingFigures(trial),
      ...flight,
      jumpHeightTotal: (flight.jumpHeightImpulse ?? NaN) + lift,
      ...startFigures(trial, onset, takeoff, landing.touchdown),
      ...pushFigures(trial, push),
      ...landed(trial, landing),
    },
    contacts: [],
    ledger: ledgerOf(trial, [
      ['unweighting', onset],
      ['braking', push.minimumVelocity],
      ['propulsion', push.zeroVelocity],
      ['flight', takeoff],
      ...landingMarks(landing),
    ]),
  }
}

function squatTruth(trial: Trial): Truth {
  const takeoff = trueTakeoff(trial, firstFlight(trial))
  const onset = trueOnset(trial, takeoff)
  const landing = landingEvents(trial)
  return {
    events: { onset, takeoff, ...landing },
    metrics: {
      ...weighingFigures(trial),
      ...flightFigures(trial, takeoff, landing.touchdown),
      ...startFigures(trial, onset, takeoff, landing.touchdown),
      ...squatFigures(trial, onset, takeoff),
      ...landed(trial, landing),
    },
    contacts: [],
    ledger: ledgerOf(trial, [['propulsion', onset], ['flight', takeoff], ...landingMarks(landing)]),
  }
}

/** The momentum of a fall from rest, which ends at the first touch. */
const arrivalEntry = (trial: Trial, touchdown: number): Truth['ledger'][number] => ({
  phase: 'arrival',
  startS: trial.marks.fromS,
  endS: touchdown,
  netImpulse: gained(trial, trial.marks.fromS, touchdown),
})

function dropJumpTruth(trial: Trial): Truth {
  const arrivalS = trial.marks.arrivalS ?? NaN
  const rebound = contactEvents(trial, arrivalS, firstFlight(trial))
  const contact = trueContact(trial, arrivalS, 0)
  const landing = landingEvents(trial)
  const { touchdown: arrival, zeroVelocity, takeoff } = rebound
  const flight = flightFigures(trial, takeoff, landing.touchdown)
  return {
    events: { arrival, zeroVelocity, takeoff, ...landing },
    metrics: {
      ...weighingFigures(trial),
      ...flight,
      jumpHeightTotal: (flight.jumpHeightImpulse ?? NaN) + trial.motion.displacement(takeoff),
      ...reboundFigures(trial, rebound),
      ...dropFigures(trial, arrival),
      rsi: contact.rsi,
      rsiFlightContact: contact.rsiFlightContact,
      ...landed(trial, landing),
    },
    contacts: [contact],
    ledger: [
      arrivalEntry(trial, arrival),
      ...ledgerOf(trial, [
        ['braking', arrival],
        ['propulsion', zeroVelocity],
        ['flight', takeoff],
        ...landingMarks(landing),
      ]),
    ],
  }
}

function dropLandingTruth(trial: Trial): Truth {
  const landing = landingEvents(trial)
  return {
    events: landing,
    metrics: {
      ...weighingFigures(trial),
      ...dropFigures(trial, landing.touchdown),
      ...landed(trial, landing),
    },
    contacts: [],
    ledger: [arrivalEntry(trial, landing.touchdown), ...ledgerOf(trial, landingMarks(landing))],
  }
}

function hopsTruth(trial: Trial): Truth {
  const takeoff = trueTakeoff(trial, firstFlight(trial))
  const onset = trueOnset(trial, takeoff)
  const landing = landingEvents(trial)
  const contacts = trueHops(trial)
  const between = contacts.flatMap(({ touchdownS, takeoffS }): Mark[] => [
    ['contact', touchdownS],
    ['flight', takeoffS],
  ])
  return {
    events: { onset, takeoff, ...landing },
    metrics: { ...weighingFigures(trial), ...hopsFigures(contacts), ...landed(trial, landing) },
    contacts,
    ledger: ledgerOf(trial, [
      ['contact', onset],
      ['flight', takeoff],
      ...between,
      ['contact', landing.touchdown],
    ]),
  }
}

/**
 * The truth of a trial by the published definitions, read off the continuous noise-free force and its motion in
 * closed form; extremes and crossings by search, impulses of a foot by Gauss's rule. Nothing of it comes from a
 * sampled recording. After a step-off the landing's figures are left out.
 */
export function truthOf(trial: Trial): Truth {
  switch (trial.protocol) {
    case 'cmj':
    case 'slcmj':
      return countermovementTruth(trial)
    case 'sj':
      return squatTruth(trial)
    case 'dj':
      return dropJumpTruth(trial)
    case 'dropLanding':
      return dropLandingTruth(trial)
    case 'hops':
      return hopsTruth(trial)
  }
}
