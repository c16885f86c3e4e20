import type { AnalyseOptions, ForceChannel, Test } from '../types.ts'
import type { Crossing } from '../events/flank.ts'
import type { JumpEvents } from '../events/jump-events.ts'
import type { TrialEvents } from '../events/trial-events.ts'
import type { Weighing } from '../events/weighing.ts'
import type { Zero, ZeroedSignal } from '../events/zero.ts'
import type { Settings } from '../settings.ts'
import { grossImpulse } from '../signal/gross-impulse.ts'
import { forceAt, instantAt, type Instant, type Motion } from '../signal/motion.ts'
import { integratedNoise } from '../signal/noise.ts'
import { meanOver, type RunningSums } from '../signal/running-mean.ts'
import { Budget, type Quantity } from '../uncertainty/budget.ts'

/** One plate's inputs to the budget. */
export interface PlateInputs {
  channel: ForceChannel
  force: Float64Array
  sums: RunningSums
  /** Error of the zero, N. */
  offset: Quantity
  /** Relative error of the calibration. */
  gain: Quantity
  /** Mean force on this plate over the weighing, N. */
  stanceForce: number
}

/** A trial whose weight, motion and events are found. */
export interface LocatedTrial<
  W extends Weighing | null = Weighing | null,
  E extends TrialEvents = TrialEvents,
> {
  /** `null` where no quiet stance was found: the motion then goes by a recorded mass, or by none (NaN). */
  weighing: W
  motion: Motion
  events: E
  /** Velocity where the integration starts and its standard uncertainty, m/s; at rest where not given. */
  startVelocity?: { value: number; u: number }
}

/** A trial as the metrics see it: events, motion, and the quantities that everything else is made of. */
export interface TrialModel<
  W extends Weighing | null = Weighing | null,
  E extends TrialEvents = TrialEvents,
> {
  signal: ZeroedSignal
  settings: Settings
  test: Test
  zero: Zero
  weighing: W
  motion: Motion
  events: E
  sums: RunningSums
  budget: Budget
  plates: PlateInputs[]
  gravity: Quantity
  systemWeight: Quantity
  systemMass: Quantity
  bodyWeight: Quantity
  bodyMass: Quantity
  /** Errors of the weighing that are not the plates' own: noise and sway. */
  weighingError: Quantity
  /** Velocity of the body where the integration starts, taken as zero, or told by the flight. */
  startVelocity: Quantity
  /** Error of the force from drift of the plates since their zero was taken, N for each second. */
  drift: Quantity
  /** Integral of the noise from one event to the next, N·s, in the order of `boundaries`. */
  noise: Quantity[]
  boundaries: number[]
}

/** A jump from stance: it was weighed before, and has a beginning and a takeoff. */
export type JumpModel = TrialModel<Weighing, JumpEvents>

/** A trial with a takeoff, from stance or out of a fall. */
export type TakeoffModel = TrialModel<Weighing | null, TrialEvents & { takeoff: Crossing }>

const sides: readonly ForceChannel[] = ['left', 'right']

/** Whether a channel is one of two feet. */
export function isSide(channel: ForceChannel): channel is 'left' | 'right' {
  return sides.includes(channel)
}

function plateInputs(
  signal: ZeroedSignal,
  weighing: Weighing | null,
  zero: Zero,
  options: AnalyseOptions,
  budget: Budget,
): PlateInputs[] {
  return signal.plates.map(({ channel, force, sums }, i) => {
    const calibration = options.calibrationU[channel] ?? 0
    return {
      channel,
      force,
      sums,
      offset: budget.input(0, zero.offsetU[i], zero.offsetDof[i]),
      gain: budget.input(0, calibration / 2, Infinity, true),
      stanceForce: weighing ? meanOver(sums, weighing.window.from, weighing.window.to) : NaN,
    }
  })
}

/** The instants between which the noise of the integral is independent. */
function boundariesOf(events: TrialEvents): number[] {
  return [
    events.onset?.position,
    events.arrival?.position,
    events.minimumVelocity?.position,
    events.zeroVelocity,
    events.takeoff?.position,
    events.touchdown?.position,
    events.landingZeroVelocity,
    events.still,
  ].filter((position) => position !== null && position !== undefined)
}

/** The weight as weighed: noise and sway, drift since the zero was taken, the plates' zero and calibration. */
function weighed(
  { window, systemWeight, noiseU, noiseDof, swayU, swayDof }: Weighing,
  { centre }: Zero,
  plates: readonly PlateInputs[],
  drift: Quantity,
  dt: number,
  budget: Budget,
) {
  const weighingError = budget.linear(0, [
    [1, budget.input(0, noiseU, noiseDof)],
    [1, budget.input(0, swayU, swayDof)],
  ])
  const weighedS = ((window.from + window.to - 1) / 2) * dt
  const weight = budget.linear(systemWeight, [
    [1, weighingError],
    [weighedS - centre * dt, drift],
    ...plates.flatMap(({ offset, gain, stanceForce }) => [
      [1, offset] as const,
      [stanceForce, gain] as const,
    ]),
  ])
  return { weighingError, systemWeight: weight }
}

/** The weight of a recorded mass, which is as sure as such records are; NaN where there is none. */
function recorded({ systemWeight }: Motion, gravity: Quantity, settings: Settings, budget: Budget) {
  const weighingError = budget.input(0, settings.recordedMassU * systemWeight)
  const weight = budget.pair(systemWeight, 1, weighingError, systemWeight / gravity.value, gravity)
  return { weighingError, systemWeight: weight }
}

/** Sets up the uncertainty budget of a located trial with its independent inputs. */
export function buildModel<W extends Weighing | null, E extends TrialEvents>(
  signal: ZeroedSignal,
  zero: Zero,
  { weighing, motion, events, startVelocity }: LocatedTrial<W, E>,
  test: Test,
  options: AnalyseOptions,
  settings: Settings,
): TrialModel<W, E> {
  const budget = new Budget(options.uncertainty !== false, settings.coverage)
  const { dt } = signal
  const plates = plateInputs(signal, weighing, zero, options, budget)
  const gravityU = options.gravityUncertainty ?? settings.gravityU
  const gravity = budget.input(options.gravity, gravityU, Infinity, true)
  const drift = budget.linear(
    0,
    plates.map(() => [1, budget.input(0, settings.driftU)] as const),
  )
  const { weighingError, systemWeight } = weighing
    ? weighed(weighing, zero, plates, drift, dt, budget)
    : recorded(motion, gravity, settings, budget)
  const bodyWeight = budget.minus(systemWeight, budget.scaled(gravity, test.externalLoadKg))
  const boundaries = boundariesOf(events)
  const noise = boundaries
    .slice(1)
    .map((to, i) =>
      budget.input(0, integratedNoise(zero.total, (to - boundaries[i]) * dt, dt), zero.noiseDof),
    )
  const start = startVelocity ?? { value: 0, u: settings.swayVelocityChange / Math.SQRT2 }
  return {
    signal,
    settings,
    test,
    zero,
    weighing,
    motion,
    events,
    sums: signal.sums,
    budget,
    plates,
    gravity,
    systemWeight,
    systemMass: budget.over(systemWeight, gravity),
    bodyWeight,
    bodyMass: budget.over(bodyWeight, gravity),
    weighingError,
    startVelocity: budget.input(start.value, start.u),
    drift,
    noise,
    boundaries,
  }
}

/** Share of each noise integral that lies between the start and a position, as a factor on its standard uncertainty. */
function noiseTerms(model: TrialModel, position: number): (readonly [number, Quantity])[] {
  const { start } = model.motion
  const sign = position < start ? -1 : 1
  const from = sign > 0 ? start : position
  const to = sign > 0 ? position : start
  const terms: (readonly [number, Quantity])[] = []
  for (let i = 0; i < model.noise.length; i++) {
    const begins = model.boundaries[i]
    const ends = model.boundaries[i + 1]
    const shared = Math.min(to, ends) - Math.max(from, begins)
    if (shared > 0) terms.push([sign * Math.sqrt(shared / (ends - begins)), model.noise[i]])
  }
  return terms
}

/** Error of the gross impulse on the plates from the start to a position: zero, calibration, drift, noise; N·s. */
export function grossError(model: TrialModel, position: number): Quantity {
  const { budget, motion, plates, zero } = model
  if (!budget.on) return budget.exact(0)
  const tau = (position - motion.start) * motion.dt
  const sinceZero = (motion.start - zero.centre) * motion.dt
  return budget.linear(0, [
    ...plates.flatMap(({ offset, gain, force, sums }) => [
      [tau, offset] as const,
      [grossImpulse(force, sums, motion.start, position, motion.dt), gain] as const,
    ]),
    [(tau * tau) / 2 + sinceZero * tau, model.drift],
    ...noiseTerms(model, position),
  ])
}

/** Velocity at an instant with its uncertainty: v = v₀ + g·(J/W − τ), J the gross impulse since the start. */
export function velocityOf(model: TrialModel, instant: Instant): Quantity {
  const { budget, motion, systemWeight, gravity, startVelocity } = model
  if (!budget.on) return budget.exact(instant.velocity)
  const g = motion.gravity
  const w = motion.systemWeight
  const tau = (instant.position - motion.start) * motion.dt
  const gained = instant.velocity - startVelocity.value
  return budget.linear(instant.velocity, [
    [-(gained + g * tau) / w, systemWeight],
    [gained / g, gravity],
    [g / w, grossError(model, instant.position)],
    [1, startVelocity],
  ])
}

/** Displacement at an instant with its uncertainty; the noise of the double integral is an input of its own. */
export function displacementOf(model: TrialModel, instant: Instant): Quantity {
  const { budget, motion, systemWeight, gravity, startVelocity, plates, zero } = model
  const { displacement, position } = instant
  if (!budget.on) return budget.exact(displacement)
  const g = motion.gravity
  const w = motion.systemWeight
  const tau = (position - motion.start) * motion.dt
  const gained = displacement - startVelocity.value * tau
  const twice = (w / g) * gained + (w * tau * tau) / 2
  const sinceZero = (motion.start - zero.centre) * motion.dt
  const own = integratedNoise(zero.total, Math.abs(tau), motion.dt) * (Math.abs(tau) / Math.sqrt(3))
  const gross = w * tau + (w / g) * (instant.velocity - startVelocity.value)
  return budget.linear(displacement, [
    [-(gained + (g * tau * tau) / 2) / w, systemWeight],
    [gained / g, gravity],
    [tau, startVelocity],
    [(g / w) * ((tau * tau * tau) / 6 + (sinceZero * tau * tau) / 2), model.drift],
    [g / w, budget.input(0, own, zero.noiseDof)],
    ...plates.flatMap(({ offset, gain, force, sums }) => {
      const share = gross === 0 ? 0 : grossImpulse(force, sums, motion.start, position, motion.dt) / gross
      return [[(g / w) * ((tau * tau) / 2), offset] as const, [(g / w) * twice * share, gain] as const]
    }),
  ])
}

/** A force read off the trace at a position, with noise of its own of standard uncertainty `u`. */
export function forceOf(model: TrialModel, value: number, position: number, u: number): Quantity {
  const { budget, plates, zero, signal } = model
  if (!budget.on) return budget.exact(value)
  return budget.linear(value, [
    [1, budget.input(0, u, zero.noiseDof)],
    [(position - zero.centre) * signal.dt, model.drift],
    ...plates.flatMap(({ offset, gain, force }) => [
      [1, offset] as const,
      [plates.length === 1 ? value : forceAt(force, position), gain] as const,
    ]),
  ])
}

/** The motion at a position between samples. */
export function at(model: TrialModel, position: number, knownForce?: number): Instant {
  return instantAt(model.motion, position, knownForce)
}
