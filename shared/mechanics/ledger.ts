import type { Figure, Ledger, Phase } from './types.ts'
import { at, type TrialModel } from './metrics/trial-model.ts'
import type { PhaseSpan } from './phases.ts'

/** Phases that end where the force crosses the event force, unless they end at rest. */
const endsAtCrossing: readonly Phase[] = ['arrival', 'propulsion', 'contact', 'flight']

/** Momentum where a phase ends, N·s. */
function momentumAfter(model: TrialModel, { phase, to }: PhaseSpan): number {
  const { motion, events, settings } = model
  const isCrossing = endsAtCrossing.includes(phase) && to !== events.still
  const { velocity } = at(model, to, isCrossing ? settings.eventForceN : undefined)
  return (motion.systemWeight / motion.gravity) * velocity
}

/** What the account opens with: nothing at rest; of a fall the rest is on the box, of stance it is where it begins. */
function openingOf(model: TrialModel, first: PhaseSpan | undefined): number {
  const { motion } = model
  if (!first || first.phase === 'arrival' || first.from === motion.start) return 0
  return (motion.systemWeight / motion.gravity) * at(model, first.from).velocity
}

/**
 * The trial's momentum account: opening balance zero at rest, one entry a phase with its net impulse, and the closing
 * balance at still. It closes where zero lies within its uncertainty. It cannot be tested without a figure for the
 * closing balance: where the athlete does not come to stand still, or where the motion was integrated backwards from
 * that rest, so that it closes by construction.
 */
export function ledgerOf(model: TrialModel, phases: readonly PhaseSpan[], closing?: Figure): Ledger {
  const { signal, motion } = model
  const mass = motion.systemWeight / motion.gravity
  const opening = openingOf(model, phases[0])
  let before = 0
  const entries = phases.map((span) => {
    const balance = momentumAfter(model, span) - opening
    const netImpulse = balance - before
    before = balance
    return {
      phase: span.phase,
      startS: span.from * signal.dt,
      endS: span.to * signal.dt,
      netImpulse,
      deltaVelocity: netImpulse / mass,
      balance,
    }
  })
  if (!closing) return { entries, closing: { value: before, U: null, closes: null } }
  const closes = closing.U === null ? null : Math.abs(closing.value) <= closing.U
  return { entries, closing: { value: closing.value, U: closing.U, closes } }
}
