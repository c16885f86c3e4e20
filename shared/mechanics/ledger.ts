import type { Figure, Ledger } from './types.ts'
import type { JumpModel } from './metrics/jump-model.ts'
import { at } from './metrics/jump-model.ts'
import { phasesOf } from './phases.ts'

/** Momentum at an event; force is the threshold's at takeoff and touchdown. */
function momentumAt(model: JumpModel, position: number): number {
  const { events, motion, settings } = model
  const crossing = position === events.takeoff.position || position === events.touchdown?.position
  const { velocity } = at(model, position, crossing ? settings.eventForceN : undefined)
  return (motion.systemWeight / motion.gravity) * velocity
}

/**
 * The trial's momentum account: opening balance zero at rest, one entry a phase with its net impulse, and the closing
 * balance at still. It closes where zero lies within its uncertainty; without stillness it cannot be tested.
 */
export function ledgerOf(model: JumpModel, closing: Figure | undefined): Ledger {
  const { signal, motion } = model
  const mass = motion.systemWeight / motion.gravity
  let before = 0
  const entries = phasesOf(model.events).map(({ phase, from, to }) => {
    const balance = momentumAt(model, to)
    const netImpulse = balance - before
    before = balance
    return {
      phase,
      startS: from * signal.dt,
      endS: to * signal.dt,
      netImpulse,
      deltaVelocity: netImpulse / mass,
      balance,
    }
  })
  if (!closing) return { entries, closing: { value: before, U: null, closes: null } }
  const closes = closing.U === null ? null : Math.abs(closing.value) <= closing.U
  return { entries, closing: { value: closing.value, U: closing.U, closes } }
}
