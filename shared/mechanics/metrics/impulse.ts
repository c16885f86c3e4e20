import type { Quantity } from '../uncertainty/budget.ts'
import { at, velocityOf, type JumpModel } from './trial-model.ts'
import { miss, put, reasons, type Measured } from './measured.ts'

/** Greatest downward velocity, where force comes back to the weight; `null` without a countermovement. */
export function downwardVelocityOf(model: JumpModel): Quantity | null {
  const { minimumVelocity } = model.events
  return minimumVelocity && velocityOf(model, at(model, minimumVelocity.position))
}

/** Net impulse of a push that begins and ends its way up at once: all of it is propulsion. */
export function pushImpulses(model: JumpModel, takeoffVelocity: Quantity, into: Measured): void {
  const net = model.budget.times(model.systemMass, takeoffVelocity)
  put(into, 'netImpulse', net)
  put(into, 'propulsionImpulse', net)
}

/** Net impulses of a push with a countermovement, each the change of momentum over its phase. */
export function counterImpulses(model: JumpModel, takeoffVelocity: Quantity, into: Measured): void {
  const { budget, systemMass, events } = model
  pushImpulses(model, takeoffVelocity, into)
  const downward = downwardVelocityOf(model)
  if (!downward || events.zeroVelocity === null)
    return miss(into, ['unweightingImpulse', 'brakingImpulse', 'propulsionImpulse'], reasons.noDip)
  const unweighting = budget.times(systemMass, downward)
  put(into, 'unweightingImpulse', unweighting)
  put(into, 'brakingImpulse', budget.scaled(unweighting, -1))
}
