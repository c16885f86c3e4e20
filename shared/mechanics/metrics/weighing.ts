import { at, grossError, type TrialModel } from './trial-model.ts'
import { miss, put, reasons, type Measured } from './measured.ts'

/** Weight and mass from the quiet stance. A recorded mass is no measurement: it gives no figures. */
export function weighingFigures(model: TrialModel, into: Measured): void {
  const { budget, weighing, systemWeight, bodyWeight, bodyMass } = model
  if (!weighing)
    return miss(into, ['bodyWeight', 'systemWeight', 'bodyMass', 'weighingSpread'], reasons.notWeighed)
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
 * What the whole movement says from rest to rest, from the onset to still: the closing balance, momentum at still less
 * momentum at the onset, and the weight that would make it zero, the mean force. One of the two ends is where the
 * integration starts.
 */
export function restToRestFigures(model: TrialModel, into: Measured): void {
  const { budget, motion, events, systemWeight, startVelocity, settings } = model
  const { onset, still } = events
  if (!onset || still === null)
    return miss(into, ['restToRestWeight', 'closingBalance'], onset ? reasons.noStill : reasons.noStance)
  const backwards = motion.start !== onset.position
  const end = backwards ? onset.position : still
  const sign = backwards ? -1 : 1
  const duration = (still - onset.position) * motion.dt
  const mass = motion.systemWeight / motion.gravity
  const closing = sign * mass * at(model, end).velocity
  const atRest = budget.input(0, settings.swayVelocityChange / Math.SQRT2)
  const gross = grossError(model, end)
  const rest = [
    [mass, startVelocity],
    [mass, atRest],
  ] as const
  put(into, 'closingBalance', budget.linear(closing, [[sign, gross], [-duration, systemWeight], ...rest]))
  const restToRest = budget.linear(motion.systemWeight + closing / duration, [
    [sign / duration, gross],
    ...rest.map(([factor, quantity]) => [factor / duration, quantity] as const),
  ])
  put(into, 'restToRestWeight', restToRest)
}
