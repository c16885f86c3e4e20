import { syntheticProtocols } from '../../seed/synthetic/attempts.ts'
import type { SyntheticProtocol } from '../../seed/synthetic/attempts.ts'
import { perform } from '../../seed/synthetic/perform.ts'
import type { Trial } from '../../seed/synthetic/perform.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import { analyse } from '../../shared/mechanics/analyse.ts'
import { catalogue } from '../../shared/mechanics/catalogue.ts'
import type { Protocol, Test } from '../../shared/mechanics/types.ts'

/** The tests for which the catalogue has figures: each of them is put to the proof. */
export const engineProtocols: SyntheticProtocol[] = syntheticProtocols.filter((protocol) =>
  Object.values(catalogue).some((metric) => metric.protocols.some((known) => known === protocol)),
)

/** What is told to the engine of a synthetic trial. */
export function testOf({ protocol, side, athlete, boxHeightM }: Trial): Test {
  // The synthetic athlete can do tests that the engine may not know yet; only known ones come here.
  return {
    protocol: protocol as Protocol,
    side,
    externalLoadKg: athlete.loadKg,
    boxHeightM,
    arms: 'hips',
  }
}

/** Whether the engine tells two trials in one recording apart. */
export function findsSeveral(protocol: SyntheticProtocol): boolean {
  const performance = perform({}, [{ protocol, leavesForS: 3 }, { protocol }])
  const [first] = performance.trials
  if (!first) return false
  const recording = recordJump(performance, { durationS: performance.endS })
  return analyse(recording, { test: testOf(first), gravity: 9.80665, calibrationU: {} }).trials.length === 2
}
