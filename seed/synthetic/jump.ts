import type { JumpOptions } from './options.ts'
import { perform } from './perform.ts'
import type { Trial } from './perform.ts'

/** One countermovement jump with its sway and heartbeat, which `seed` decides; options left out are the defaults. */
export function makeJump(given: Partial<JumpOptions> = {}, seed = 1): Trial {
  const [jump] = perform(given, [{ protocol: 'cmj', ...given }], seed).trials
  if (!jump) throw new RangeError('An attempt makes a trial.')
  return jump
}
