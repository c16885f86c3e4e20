import { at, grossError, type JumpModel } from './jump-model.ts'
import { miss, put, reasons, type Measured } from './measured.ts'

/** Weight and mass from the quiet stance. */
export function weighingFigures(model: JumpModel, into: Measured): void {
  const { budget, weighing, systemWeight, bodyWeight, bodyMass } = model
  const samples = weighing.window.to - weighing.window.from
  const independent = Math.max(2, weighing.noiseDof + 1, samples / 50)
  const spread = budget.input(
    weighing.spread,
    weighing.spread / Math.sqrt(2 * (independent - 1)),
    independent - 1,
  )
  put(into, 'bodyWeight', bodyWeight)
  put(into, 'systemWeight', systemWeight)
  put(into, 'bodyMass', bodyMass)
  put(into, 'weighingSpread', spread)
}

/**
 * What the whole movement says from rest to rest: the closing balance m·v at still, and the weight that would make it
 * zero, the mean force.
 */
export function restToRestFigures(model: JumpModel, into: Measured): void {
  const { budget, motion, events, systemWeight, onsetVelocity, settings } = model
  if (events.still === null) return miss(into, ['restToRestWeight', 'closingBalance'], reasons.noStill)
  const duration = (events.still - motion.start) * motion.dt
  const mass = motion.systemWeight / motion.gravity
  const closing = mass * at(model, events.still).velocity
  const atRest = budget.input(0, settings.swayVelocityChange / Math.SQRT2)
  const gross = grossError(model, events.still)
  const rest = [
    [mass, onsetVelocity],
    [mass, atRest],
  ] as const
  put(into, 'closingBalance', budget.linear(closing, [[1, gross], [-duration, systemWeight], ...rest]))
  const restToRest = budget.linear(motion.systemWeight + closing / duration, [
    [1 / duration, gross],
    ...rest.map(([factor, quantity]) => [factor / duration, quantity] as const),
  ])
  put(into, 'restToRestWeight', restToRest)
}
