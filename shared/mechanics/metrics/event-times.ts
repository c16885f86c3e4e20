import type { Crossing } from '../events/flank.ts'
import { staysWithin } from '../events/turning-points.ts'
import { meanAround } from '../signal/running-mean.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import { at, velocityOf, type JumpModel, type TrialModel } from './trial-model.ts'

/** Instants of the events with their uncertainties, in seconds from the recording's first sample. */
export interface TrialTimes {
  touchdown: Quantity | null
  minimumVelocity: Quantity | null
  zeroVelocity: Quantity | null
  landingPeak: Quantity | null
  landingZeroVelocity: Quantity | null
}

/** Where the feet leave the plates. */
export interface TakeoffTime {
  takeoff: Quantity
}

/** Of a jump from stance. */
export interface EventTimes extends TrialTimes, TakeoffTime {
  onset: Quantity
}

/** Share of the variance of touches of the same kind that is the same in all of them. */
const alikeShare = 0.2

/** Longest time that a touch is taken to need to load the plates, s. */
const longestRiseS = 0.03

/** Time from a touch until the force is beyond what ringing of the plates can reach, s. */
function riseTime({ signal, settings }: TrialModel, position: number): number {
  const { total, dt } = signal
  const latest = Math.min(total.length - 1, position + longestRiseS / dt)
  let i = Math.ceil(position)
  while (i < latest && total[i] < settings.touchRiseN) i++
  return (i - position) * dt
}

/**
 * A crossing of the event force moves with the noise of its fit and with the zero of the plates. A touch sets off more
 * than shows in the fit, which moves a gentle crossing further than a steep one; touches of the same kind share
 * a part of its variance, the error `alike` of size 1.
 */
export function crossingTime(
  model: TrialModel,
  { position, positionU, ringingU, slope }: Crossing,
  alike?: Quantity,
  riseShare = model.settings.touchRiseShare,
): Quantity {
  const { budget, signal, settings, plates, zero } = model
  const { dt } = signal
  const seenU = (ringingU ?? 0) * dt
  const noiseU = Math.sqrt(Math.max(0, positionU * positionU * dt * dt - seenU * seenU))
  const isTouch = slope > 0 && ringingU !== undefined
  const gentle = isTouch ? Math.max(0, riseTime(model, position) - settings.touchQuickS) : 0
  const touchU = Math.max(seenU, riseShare * gentle)
  const own = alike ? Math.sqrt(1 - alikeShare) : 1
  const terms: (readonly [number, Quantity])[] = [
    [1, budget.input(0, noiseU, zero.noiseDof)],
    ...plates.map(({ offset }) => [-dt / slope, offset] as const),
  ]
  if (touchU > 0) terms.push([own * touchU, budget.input(0, 1)])
  if (touchU > 0 && alike) terms.push([Math.sqrt(alikeShare) * touchU, alike])
  return budget.linear(position * dt, terms)
}

/** The onset moves with the noise of its fit and, because its threshold is a part of the weight, with the weighing. */
function onsetTime({ budget, events, signal, weighingError, zero }: JumpModel): Quantity {
  const { position, positionU, level, slope } = events.onset
  return budget.linear(position * signal.dt, [
    [1, budget.input(0, positionU * signal.dt, zero.noiseDof)],
    [(level * signal.dt) / slope, weighingError],
  ])
}

/** Longest time that an ill-defined instant is taken to be unsure by, s. */
const unsureS = 0.5
/** Half the running mean over which force is compared with the weight, s. */
const smoothedS = 0.006

/** Where force passes the weight: an error of force or weight moves it as far as the force stays within that error. */
function weightCrossingTime(model: TrialModel): Quantity | null {
  const { budget, events, signal, motion, weighingError } = model
  if (!events.minimumVelocity) return null
  const { position, forceU } = events.minimumVelocity
  const error = budget.pair(0, 1, budget.input(0, forceU), 1, weighingError)
  const u = budget.combined(error).u
  if (!(u > 0)) return budget.exact(position * signal.dt)
  const half = Math.max(1, Math.round(smoothedS / signal.dt))
  const distance = (i: number) => meanAround(model.sums, i, half) - motion.systemWeight
  const stays = staysWithin(distance, position, u, unsureS / signal.dt) * signal.dt
  return budget.linear(position * signal.dt, [[stays / u, error]])
}

/**
 * Where velocity is zero: an error of the velocity moves it as far as the velocity stays within that error. Velocity
 * comes to rest in a curve, so an error of twice the size moves it more than twice as far; the interval is of the
 * larger one.
 */
function zeroVelocityTime(model: TrialModel, position: number): Quantity {
  const { budget, motion, signal } = model
  if (!budget.on) return budget.exact(position * signal.dt)
  const velocity = velocityOf(model, at(model, position))
  const u = budget.combined(velocity).u
  const { velocity: v } = at(model, position)
  const distance = (i: number) => (motion.velocity[i] ?? Infinity) - v
  const stays = (staysWithin(distance, position, 2 * u, unsureS / signal.dt) * signal.dt) / 2
  return budget.linear(position * signal.dt, [[u > 0 ? -stays / u : 0, velocity]])
}

/** Times of what any trial may have: its landing, and the turning points of its movement. */
export function trialTimes(model: TrialModel): TrialTimes {
  const { budget, events, signal, settings } = model
  const { touchdown, zeroVelocity, landingPeak, landingZeroVelocity } = events
  return {
    touchdown: touchdown && crossingTime(model, touchdown, undefined, settings.landingRiseShare),
    minimumVelocity: weightCrossingTime(model),
    zeroVelocity: zeroVelocity === null ? null : zeroVelocityTime(model, zeroVelocity),
    landingPeak:
      landingPeak && budget.input(landingPeak.position * signal.dt, landingPeak.positionU * signal.dt),
    landingZeroVelocity: landingZeroVelocity === null ? null : zeroVelocityTime(model, landingZeroVelocity),
  }
}

/** Times of the events of a jump from stance. */
export function eventTimes(model: JumpModel): EventTimes {
  return {
    onset: onsetTime(model),
    takeoff: crossingTime(model, model.events.takeoff),
    ...trialTimes(model),
  }
}
