import type { AnalyseOptions, ForceChannel, Test } from '../types.ts'
import type { JumpEvents, LocatedJump } from '../events/jump-events.ts'
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

/** A trial as the metrics see it: events, motion, and the quantities that everything else is made of. */
export interface JumpModel {
  signal: ZeroedSignal
  settings: Settings
  test: Test
  zero: Zero
  weighing: Weighing
  motion: Motion
  events: JumpEvents
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
  /** Velocity of the body at onset, taken as zero. */
  onsetVelocity: Quantity
  /** Error of the force from drift of the plates since their zero was taken, N for each second. */
  drift: Quantity
  /** Integral of the noise from one event to the next, N·s, in the order of `boundaries`. */
  noise: Quantity[]
  boundaries: number[]
}

const sides: readonly ForceChannel[] = ['left', 'right']

/** Whether a channel is one of two feet. */
export function isSide(channel: ForceChannel): channel is 'left' | 'right' {
  return sides.includes(channel)
}

function plateInputs(
  signal: ZeroedSignal,
  weighing: Weighing,
  zero: Zero,
  options: AnalyseOptions,
  budget: Budget,
): PlateInputs[] {
  return signal.plates.map(({ channel, force, sums }, i) => {
    const calibration = options.calibrationU[channel] ?? 0
    const { from, to } = weighing.window
    return {
      channel,
      force,
      sums,
      offset: budget.input(0, zero.offsetU[i], zero.offsetDof[i]),
      gain: budget.input(0, calibration / 2, Infinity, true),
      stanceForce: meanOver(sums, from, to),
    }
  })
}

/** The instants between which the noise of the integral is independent. */
function boundariesOf(events: JumpEvents): number[] {
  const { onset, minimumVelocity, zeroVelocity, takeoff, touchdown, landingZeroVelocity, still } = events
  return [
    onset.position,
    minimumVelocity?.position,
    zeroVelocity,
    takeoff.position,
    touchdown?.position,
    landingZeroVelocity,
    still,
  ].filter((position) => position !== null && position !== undefined)
}

/** Sets up the uncertainty budget of a located jump with its independent inputs. */
export function buildModel(
  signal: ZeroedSignal,
  zero: Zero,
  { weighing, motion, events }: LocatedJump,
  test: Test,
  options: AnalyseOptions,
  settings: Settings,
): JumpModel {
  const budget = new Budget(options.uncertainty !== false, settings.coverage)
  const { dt } = signal
  const plates = plateInputs(signal, weighing, zero, options, budget)
  const gravity = budget.input(
    options.gravity,
    options.gravityUncertainty ?? settings.gravityU,
    Infinity,
    true,
  )
  const weighingError = budget.linear(0, [
    [1, budget.input(0, weighing.noiseU, weighing.noiseDof)],
    [1, budget.input(0, weighing.swayU, weighing.swayDof)],
  ])
  const drift = budget.input(0, settings.driftU)
  const weighedS = ((weighing.window.from + weighing.window.to - 1) / 2) * dt
  const zeroedS = zero.centre * dt
  const systemWeight = budget.linear(weighing.systemWeight, [
    [1, weighingError],
    [weighedS - zeroedS, drift],
    ...plates.flatMap(({ offset, gain, stanceForce }) => [
      [1, offset] as const,
      [stanceForce, gain] as const,
    ]),
  ])
  const systemMass = budget.over(systemWeight, gravity)
  const bodyWeight = budget.minus(systemWeight, budget.scaled(gravity, test.externalLoadKg))
  const boundaries = boundariesOf(events)
  const noise = boundaries
    .slice(1)
    .map((to, i) =>
      budget.input(0, integratedNoise(zero.total, (to - boundaries[i]) * dt, dt), zero.noiseDof),
    )
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
    systemMass,
    bodyWeight,
    bodyMass: budget.over(bodyWeight, gravity),
    weighingError,
    onsetVelocity: budget.input(0, settings.swayVelocityChange / Math.SQRT2),
    drift,
    noise,
    boundaries,
  }
}

/** Share of each noise integral that lies before a position, as a factor on its standard uncertainty. */
function noiseTerms(model: JumpModel, position: number, factor: number): (readonly [number, Quantity])[] {
  const terms: (readonly [number, Quantity])[] = []
  for (let i = 0; i < model.noise.length; i++) {
    const from = model.boundaries[i]
    if (position <= from) break
    const share = Math.min(1, (position - from) / (model.boundaries[i + 1] - from))
    terms.push([factor * Math.sqrt(share), model.noise[i]])
  }
  return terms
}

/** Error of the gross impulse on the plates from onset to a position: zero, calibration, drift, noise; N·s. */
export function grossError(model: JumpModel, position: number, noiseFactor = 1): Quantity {
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
    ...noiseTerms(model, position, noiseFactor),
  ])
}

/** Velocity at an instant with its uncertainty: v = g·(J/W − τ), J the gross impulse since onset. */
export function velocityOf(model: JumpModel, instant: Instant): Quantity {
  const { budget, motion, systemWeight, gravity } = model
  if (!budget.on) return budget.exact(instant.velocity)
  const g = motion.gravity
  const w = motion.systemWeight
  const tau = (instant.position - motion.start) * motion.dt
  return budget.linear(instant.velocity, [
    [-(instant.velocity + g * tau) / w, systemWeight],
    [instant.velocity / g, gravity],
    [g / w, grossError(model, instant.position)],
    [1, model.onsetVelocity],
  ])
}

/** Displacement at an instant with its uncertainty; the noise of the double integral is an input of its own. */
export function displacementOf(model: JumpModel, instant: Instant): Quantity {
  const { budget, motion, systemWeight, gravity, plates, zero } = model
  const { displacement, position } = instant
  if (!budget.on) return budget.exact(displacement)
  const g = motion.gravity
  const w = motion.systemWeight
  const tau = (position - motion.start) * motion.dt
  const twice = (w / g) * displacement + (w * tau * tau) / 2
  const sinceZero = (motion.start - zero.centre) * motion.dt
  const own = integratedNoise(zero.total, tau, motion.dt) * (tau / Math.sqrt(3))
  const gross = model.systemWeight.value * tau + (w / g) * instant.velocity
  return budget.linear(displacement, [
    [-(displacement + (g * tau * tau) / 2) / w, systemWeight],
    [displacement / g, gravity],
    [tau, model.onsetVelocity],
    [(g / w) * ((tau * tau * tau) / 6 + (sinceZero * tau * tau) / 2), model.drift],
    [g / w, budget.input(0, own, zero.noiseDof)],
    ...plates.flatMap(({ offset, gain, force, sums }) => {
      const share = gross === 0 ? 0 : grossImpulse(force, sums, motion.start, position, motion.dt) / gross
      return [[(g / w) * ((tau * tau) / 2), offset] as const, [(g / w) * twice * share, gain] as const]
    }),
  ])
}

/** A force read off the trace at a position, with noise of its own of standard uncertainty `u`. */
export function forceOf(model: JumpModel, value: number, position: number, u: number): Quantity {
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
export function at(model: JumpModel, position: number, knownForce?: number): Instant {
  return instantAt(model.motion, position, knownForce)
}
