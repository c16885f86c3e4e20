import type { RestSearch } from '../events/rest.ts'
import type { Stretch, Unloaded } from '../events/unloaded.ts'
import { zeroPlates } from '../events/zero.ts'
import type { TrialInput } from './protocol.ts'

/** Every time off the plates, in its order. */
export function allUnloaded({ flights, offPlate }: Unloaded): Stretch[] {
  return [...flights, ...offPlate].sort((a, b) => a.from - b.from)
}

/** So much of an unloaded stretch gives the plates' zero, s: its end, which is nearest to what is measured. */
const zeroingS = 1

/** Takes the plates' zero from an unloaded stretch, and says what a search for rest goes by. */
export function searchRest(
  { signal: recorded, test, options, settings }: TrialInput,
  empty: Stretch,
): RestSearch {
  const longest = Math.round((zeroingS + 2 * settings.flightMarginS) / recorded.dt)
  const from = Math.max(empty.from, empty.to - longest)
  const { recordedMassKg } = options
  const isRecorded = recordedMassKg !== undefined && recordedMassKg > 0
  return {
    ...zeroPlates(recorded, { from, to: empty.to }, settings),
    moved: options.movedEvents ?? {},
    settings,
    gravity: options.gravity,
    recordedKg: isRecorded ? recordedMassKg + test.externalLoadKg : null,
  }
}
