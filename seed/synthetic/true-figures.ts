import { systemKg } from './options.ts'
import type { Trial } from './perform.ts'
import { greatest, integral, lastZero } from './search.ts'
import type { ContactEvents, LandingEvents, PushEvents } from './true-events.ts'

/** Figures in SI units by metric key. */
export type Figures = Record<string, number>

/** Momentum that the system gains between two instants, N·s: the net impulse. */
export function gained({ athlete, motion }: Trial, fromS: number, toS: number): number {
  return systemKg(athlete) * (motion.velocity(toS) - motion.velocity(fromS))
}

export function weighingFigures({ athlete }: Trial): Figures {
  const { massKg, gravity } = athlete
  return { bodyMass: massKg, bodyWeight: massKg * gravity, systemWeight: systemKg(athlete) * gravity }
}

/** Of the flight from takeoff to touchdown. */
export function flightFigures({ athlete, motion }: Trial, takeoff: number, touchdown: number): Figures {
  const velocity = motion.velocity(takeoff)
  const flightTime = touchdown - takeoff
  return {
    takeoffVelocity: velocity,
    jumpHeightImpulse: velocity ** 2 / (2 * athlete.gravity),
    jumpHeightFlight: (athlete.gravity * flightTime ** 2) / 8,
    takeoffMomentum: systemKg(athlete) * velocity,
    flightTime,
  }
}

/** Of a jump that began in quiet: from onset to takeoff. */
export function startFigures(trial: Trial, onset: number, takeoff: number, touchdown: number): Figures {
  const timeToTakeoff = takeoff - onset
  const { jumpHeightImpulse = NaN } = flightFigures(trial, takeoff, touchdown)
  return {
    timeToTakeoff,
    netImpulse: gained(trial, onset, takeoff),
    rsiModified: jumpHeightImpulse / timeToTakeoff,
    flightPerTakeoffTime: (touchdown - takeoff) / timeToTakeoff,
    peakForce: greatest(trial.force, onset, takeoff).value,
  }
}

/** Of the way up from rest to takeoff. */
function propulsionFigures(trial: Trial, fromS: number, takeoff: number): Figures {
  const { motion, force, athlete } = trial
  const massKg = systemKg(athlete)
  const power = (timeS: number): number => force(timeS) * motion.velocity(timeS)
  const rise = motion.displacement(takeoff) - motion.displacement(fromS)
  const kinetic = (timeS: number): number => (massKg * motion.velocity(timeS) ** 2) / 2
  const work = kinetic(takeoff) - kinetic(fromS) + massKg * athlete.gravity * rise
  const durationS = takeoff - fromS
  return {
    propulsionImpulse: gained(trial, fromS, takeoff),
    propulsionTime: durationS,
    peakPropulsionForce: greatest(force, fromS, takeoff).value,
    meanPropulsionForce: gained(trial, fromS, takeoff) / durationS + massKg * athlete.gravity,
    peakVelocity: greatest(motion.velocity, fromS, takeoff).value,
    peakPower: greatest(power, fromS, takeoff).value,
    meanPropulsionPower: work / durationS,
    propulsionWork: work,
  }
}

/** Of the way down to the deepest point. */
function brakingFigures(trial: Trial, fromS: number, zeroVelocity: number): Figures {
  const durationS = zeroVelocity - fromS
  const impulse = gained(trial, fromS, zeroVelocity)
  return {
    brakingImpulse: impulse,
    brakingTime: durationS,
    peakBrakingForce: greatest(trial.force, fromS, zeroVelocity).value,
    meanBrakingForce: impulse / durationS + systemKg(trial.athlete) * trial.athlete.gravity,
    forceAtZeroVelocity: trial.force(zeroVelocity),
  }
}

export function pushFigures(trial: Trial, events: PushEvents): Figures {
  const { motion, force } = trial
  const { onset, minimumVelocity, zeroVelocity, takeoff } = events
  return {
    ...brakingFigures(trial, minimumVelocity, zeroVelocity),
    ...propulsionFigures(trial, zeroVelocity, takeoff),
    unweightingImpulse: gained(trial, onset, minimumVelocity),
    unweightingTime: minimumVelocity - onset,
    minimumForce: force(events.minimumForce),
    peakDownwardVelocity: motion.velocity(minimumVelocity),
    countermovementDepth: motion.displacement(zeroVelocity) - motion.displacement(onset),
  }
}

export function squatFigures(trial: Trial, onset: number, takeoff: number): Figures {
  return {
    ...propulsionFigures(trial, onset, takeoff),
    force50: trial.force(onset + 0.05),
    force100: trial.force(onset + 0.1),
    force200: trial.force(onset + 0.2),
  }
}

/** Of a drop jump's contact, whose fall it takes up and gives back. */
export function reboundFigures(trial: Trial, { touchdown, zeroVelocity, takeoff }: ContactEvents): Figures {
  return {
    ...brakingFigures(trial, touchdown, zeroVelocity),
    ...propulsionFigures(trial, zeroVelocity, takeoff),
    netImpulse: gained(trial, touchdown, takeoff),
    peakForce: greatest(trial.force, touchdown, takeoff).value,
    contactTime: takeoff - touchdown,
  }
}

/** Of the fall that ends at the first touch. */
export function dropFigures({ motion, athlete }: Trial, touchdown: number): Figures {
  const velocity = motion.velocity(touchdown)
  return { dropVelocity: velocity, effectiveDropHeight: velocity ** 2 / (2 * athlete.gravity) }
}

/** Slope between the last upward crossings of 20 and 80 % of the peak before it. */
export function loadingRate(
  force: (timeS: number) => number,
  touchdown: number,
  peak: { timeS: number; value: number },
): number {
  const crossing = (share: number): number =>
    lastZero((timeS) => force(timeS) - share * peak.value, peak.timeS, touchdown - 0.005) ?? touchdown
  return (0.6 * peak.value) / (crossing(0.8) - crossing(0.2))
}

export function landingFigures(trial: Trial, events: LandingEvents): Figures {
  const { motion, force } = trial
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
    landingImpulse: -systemKg(trial.athlete) * velocity,
    landingImpulse50: integral(force, touchdown, touchdown + 0.05),
    landingImpulse100: integral(force, touchdown, touchdown + 0.1),
  }
}
