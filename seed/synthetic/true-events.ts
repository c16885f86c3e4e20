import type { Jump } from './jump.ts'
import { firstZero, greatest, lastZero, least, zeroBetween } from './search.ts'

/** Force of the definition of takeoff and touchdown, N. */
const CONTACT_N = 10
/** Deviation from weight that begins the movement, how long quiet must last before it, and the lead. */
const ONSET = { deviation: 0.025, quietS: 0.1, leadS: 0.03 }

/** The instants of the definitions on the continuous, noise-free force. Seconds from the recording's start. */
export interface TrueEvents {
  onset: number
  minimumForce: number
  minimumVelocity: number
  zeroVelocity: number
  takeoff: number
  touchdown: number
  landingPeak: number
  landingZeroVelocity: number
}

/**
 * 30 ms before the force leaves ±2.5 % of weight for good: the end of the last 100 ms before takeoff that stayed
 * within. (No jump made here rests within 2.5 % for 100 ms once it is under way.)
 */
function trueOnset(jump: Jump, weight: number, takeoff: number): number {
  const inside = (timeS: number): number => ONSET.deviation * weight - Math.abs(jump.force(timeS) - weight)
  let end = takeoff
  for (;;) {
    const leaves = lastZero(inside, end, 0)
    if (leaves === null) throw new RangeError('The jump has no quiet stance before it.')
    const enters = lastZero(inside, leaves - 1e-9, 0) ?? 0
    if (inside(leaves - 1e-6) > 0 && leaves - enters >= ONSET.quietS) return leaves - ONSET.leadS
    end = leaves - 1e-6
  }
}

export function trueEvents(jump: Jump): TrueEvents {
  const { design, motion, force, options } = jump
  const weight = options.massKg * options.gravity
  const contact = (timeS: number): number => force(timeS) - CONTACT_N
  const takeoff = zeroBetween(contact, design.unloadingS, design.liftOffS)
  const touchdown = firstZero(contact, design.touchS, design.landingEndS) ?? design.landingEndS
  const onset = trueOnset(jump, weight, takeoff)
  const minimumVelocity = least(motion.velocity, onset, takeoff).timeS
  const zeroVelocity = firstZero(motion.velocity, minimumVelocity, takeoff) ?? takeoff
  const landingZeroVelocity = firstZero(motion.velocity, touchdown, design.restS) ?? design.restS
  return {
    onset,
    minimumForce: least(force, onset, zeroVelocity).timeS,
    minimumVelocity,
    zeroVelocity,
    takeoff,
    touchdown,
    landingPeak: greatest(force, touchdown, landingZeroVelocity).timeS,
    landingZeroVelocity,
  }
}
