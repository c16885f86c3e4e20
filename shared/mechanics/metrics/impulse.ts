import type { Quantity } from '../uncertainty/budget.ts'
import { at, velocityOf, type JumpModel } from './jump-model.ts'
import { measured, missing, reasons, type Measured } from './measured.ts'

/** Greatest downward velocity, where force comes back to the weight; `null` without a countermovement. */
export function downwardVelocityOf(model: JumpModel): Quantity | null {
  const { minimumVelocity } = model.events
  return minimumVelocity && velocityOf(model, at(model, minimumVelocity.position))
}

/** Net impulses of the push, each the change of momentum over its phase. */
export function impulseFigures(model: JumpModel, takeoffVelocity: Quantity): Measured {
  const { budget, systemMass, events } = model
  const net = measured({ netImpulse: budget.times(systemMass, takeoffVelocity) })
  const downward = downwardVelocityOf(model)
  if (!downward || !events.zeroVelocity)
    return {
      ...net,
      ...missing(['unweightingImpulse', 'brakingImpulse', 'propulsionImpulse'], reasons.noDip),
    }
  const unweighting = budget.times(systemMass, downward)
  return {
    ...net,
    ...measured({
      unweightingImpulse: unweighting,
      brakingImpulse: budget.scaled(unweighting, -1),
      propulsionImpulse: budget.times(systemMass, takeoffVelocity),
    }),
  }
}
