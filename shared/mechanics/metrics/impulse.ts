import type { Quantity } from '../uncertainty/budget.ts'
import { at, velocityOf, type JumpModel } from './jump-model.ts'
import { miss, put, reasons, type Measured } from './measured.ts'

/** Greatest downward velocity, where force comes back to the weight; `null` without a countermovement. */
export function downwardVelocityOf(model: JumpModel): Quantity | null {
  const { minimumVelocity } = model.events
  return minimumVelocity && velocityOf(model, at(model, minimumVelocity.position))
}

/** Net impulses of the push, each the change of momentum over its phase. */
export function impulseFigures(model: JumpModel, takeoffVelocity: Quantity, into: Measured): void {
  const { budget, systemMass, events } = model
  const net = budget.times(systemMass, takeoffVelocity)
  put(into, 'netImpulse', net)
  const downward = downwardVelocityOf(model)
  if (!downward || events.zeroVelocity === null)
    return miss(into, ['unweightingImpulse', 'brakingImpulse', 'propulsionImpulse'], reasons.noDip)
  const unweighting = budget.times(systemMass, downward)
  put(into, 'unweightingImpulse', unweighting)
  put(into, 'brakingImpulse', budget.scaled(unweighting, -1))
  put(into, 'propulsionImpulse', net)
}
