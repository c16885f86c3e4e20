import type { Trial } from './perform.ts'
import { greatest, integral } from './search.ts'
import { landingEvents, pushEvents } from './true-events.ts'
import type { Figures } from './true-figures.ts'

/** A foot's own figures of a countermovement jump by metric key, over the phases of both feet together. */
export function footTruthOf(trial: Trial, foot: 'left' | 'right'): Figures {
  const share = (timeS: number): number =>
    foot === 'left' ? trial.leftShare(timeS) : 1 - trial.leftShare(timeS)
  const force = (timeS: number): number => trial.force(timeS) * share(timeS)
  const [flight] = trial.marks.flights
  if (!flight) throw new RangeError('A jump has a flight.')
  const { onset, minimumVelocity, zeroVelocity, takeoff } = pushEvents(trial, flight)
  const { touchdown, landingZeroVelocity } = landingEvents(trial)
  return {
    unweightingImpulse: integral(force, onset, minimumVelocity),
    brakingImpulse: integral(force, minimumVelocity, zeroVelocity),
    propulsionImpulse: integral(force, zeroVelocity, takeoff),
    peakBrakingForce: greatest(force, minimumVelocity, zeroVelocity).value,
    peakPropulsionForce: greatest(force, zeroVelocity, takeoff).value,
    landingPeakForce: greatest(force, touchdown, landingZeroVelocity).value,
  }
}
