import type { Jump } from './jump.ts'
import { greatest, integral, lastZero } from './search.ts'
import { trueEvents } from './true-events.ts'
import type { TrueEvents } from './true-events.ts'

/** What a perfect engine would say of a jump: instants, figures in SI units by metric key, ledger. */
export interface Truth {
  events: TrueEvents
  metrics: Record<string, number>
  ledger: { phase: string; startS: number; endS: number; netImpulse: number }[]
}

type Figures = Record<string, number>

/** Slope between the last upward crossings of 20 and 80 % of the peak before it. */
function loadingRate(
  force: (timeS: number) => number,
  touchdown: number,
  peak: { timeS: number; value: number },
): number {
  const crossing = (share: number): number =>
    lastZero((timeS) => force(timeS) - share * peak.value, peak.timeS, touchdown - 0.005) ?? touchdown
  return (0.6 * peak.value) / (crossing(0.8) - crossing(0.2))
}

function jumpFigures({ motion, options }: Jump, events: TrueEvents): Figures {
  const { massKg, gravity } = options
  const { onset, takeoff, touchdown } = events
  const velocity = motion.velocity(takeoff)
  const height = velocity ** 2 / (2 * gravity)
  const flightTime = touchdown - takeoff
  const timeToTakeoff = takeoff - onset
  return {
    bodyWeight: massKg * gravity,
    systemWeight: massKg * gravity,
    bodyMass: massKg,
    takeoffVelocity: velocity,
    jumpHeightImpulse: height,
    jumpHeightFlight: (gravity * flightTime ** 2) / 8,
    jumpHeightTotal: height + motion.displacement(takeoff) - motion.displacement(onset),
    takeoffMomentum: massKg * velocity,
    flightTime,
    timeToTakeoff,
    rsiModified: height / timeToTakeoff,
    flightPerTakeoffTime: flightTime / timeToTakeoff,
  }
}

function pushFigures({ motion, force, options }: Jump, events: TrueEvents): Figures {
  const { massKg, gravity } = options
  const { onset, minimumVelocity, zeroVelocity, takeoff } = events
  const gained = (from: number, to: number): number => massKg * (motion.velocity(to) - motion.velocity(from))
  const mean = (from: number, to: number): number => gained(from, to) / (to - from) + massKg * gravity
  const power = (timeS: number): number => force(timeS) * motion.velocity(timeS)
  const rise = motion.displacement(takeoff) - motion.displacement(zeroVelocity)
  const work = (massKg * motion.velocity(takeoff) ** 2) / 2 + massKg * gravity * rise
  return {
    netImpulse: gained(onset, takeoff),
    unweightingImpulse: gained(onset, minimumVelocity),
    brakingImpulse: gained(minimumVelocity, zeroVelocity),
    propulsionImpulse: gained(zeroVelocity, takeoff),
    peakForce: greatest(force, onset, takeoff).value,
    minimumForce: force(events.minimumForce),
    forceAtZeroVelocity: force(zeroVelocity),
    peakBrakingForce: greatest(force, minimumVelocity, zeroVelocity).value,
    meanBrakingForce: mean(minimumVelocity, zeroVelocity),
    peakPropulsionForce: greatest(force, zeroVelocity, takeoff).value,
    meanPropulsionForce: mean(zeroVelocity, takeoff),
    unweightingTime: minimumVelocity - onset,
    brakingTime: zeroVelocity - minimumVelocity,
    propulsionTime: takeoff - zeroVelocity,
    peakVelocity: greatest(motion.velocity, zeroVelocity, takeoff).value,
    peakDownwardVelocity: motion.velocity(minimumVelocity),
    countermovementDepth: motion.displacement(zeroVelocity) - motion.displacement(onset),
    peakPower: greatest(power, zeroVelocity, takeoff).value,
    meanPropulsionPower: work / (takeoff - zeroVelocity),
    propulsionWork: work,
  }
}

function landingFigures({ motion, force, options }: Jump, events: TrueEvents): Figures {
  const { touchdown, landingPeak, landingZeroVelocity } = events
  const peak = { timeS: landingPeak, value: force(landingPeak) }
  const velocity = motion.velocity(touchdown)
  return {
    landingPeakForce: peak.value,
    timeToLandingPeak: landingPeak - touchdown,
    landingLoadingRateMean: peak.value / (landingPeak - touchdown),
    landingLoadingRate2080: loadingRate(force, touchdown, peak),
    landingVelocity: velocity,
    landingTime: landingZeroVelocity - touchdown,
    landingDepth: motion.displacement(landingZeroVelocity) - motion.displacement(touchdown),
    landingImpulse: -options.massKg * velocity,
    landingImpulse50: integral(force, touchdown, touchdown + 0.05),
    landingImpulse100: integral(force, touchdown, touchdown + 0.1),
  }
}

/** A foot's own figures by metric key, over the phases of both feet together. */
export function footTruthOf(
  jump: Jump,
  foot: 'left' | 'right',
  events: TrueEvents = trueEvents(jump),
): Figures {
  const share = (timeS: number): number =>
    foot === 'left' ? jump.leftShare(timeS) : 1 - jump.leftShare(timeS)
  const force = (timeS: number): number => jump.force(timeS) * share(timeS)
  const { onset, minimumVelocity, zeroVelocity, takeoff, touchdown, landingZeroVelocity } = events
  return {
    unweightingImpulse: integral(force, onset, minimumVelocity),
    brakingImpulse: integral(force, minimumVelocity, zeroVelocity),
    propulsionImpulse: integral(force, zeroVelocity, takeoff),
    peakBrakingForce: greatest(force, minimumVelocity, zeroVelocity).value,
    peakPropulsionForce: greatest(force, zeroVelocity, takeoff).value,
    landingPeakForce: greatest(force, touchdown, landingZeroVelocity).value,
  }
}

function ledgerOf({ motion, options, design }: Jump, events: TrueEvents): Truth['ledger'] {
  const marks = [
    ['unweighting', events.onset],
    ['braking', events.minimumVelocity],
    ['propulsion', events.zeroVelocity],
    ['flight', events.takeoff],
    ['landing', events.touchdown],
    ['settling', events.landingZeroVelocity],
  ] as const
  return marks.map(([phase, startS], i) => {
    const endS = marks[i + 1]?.[1] ?? design.restS
    return {
      phase,
      startS,
      endS,
      netImpulse: options.massKg * (motion.velocity(endS) - motion.velocity(startS)),
    }
  })
}

/**
 * The truth of a jump by the published definitions, read off the continuous noise-free force and its motion in
 * closed form; extremes and crossings by search, impulses of a foot by Gauss's rule. Nothing of it comes from a
 * sampled recording. After a step-off the landing's figures are left out.
 */
export function truthOf(jump: Jump): Truth {
  const events = trueEvents(jump)
  const landed = jump.stepOffS === null || jump.stepOffS > events.landingZeroVelocity
  return {
    events,
    metrics: {
      ...jumpFigures(jump, events),
      ...pushFigures(jump, events),
      ...(landed ? landingFigures(jump, events) : {}),
    },
    ledger: ledgerOf(jump, events),
  }
}
