import { makeJump } from '../../seed/synthetic/jump.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import { writeDelimited } from '../../seed/synthetic/write-delimited.ts'

/** A recording of 8 s at 1000 Hz on two plates; each seed is another one. */
export function eightSeconds(seed: number): Uint8Array {
  const noise = { whiteNoiseN: 1 }
  const jump = makeJump({ takeoffVelocity: 2.2 + (seed % 8) * 0.1 }, seed)
  return writeDelimited(recordJump(jump, { durationS: 8 }, { left: noise, right: noise }, seed))
}
