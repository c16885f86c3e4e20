import type { EngineInputs } from '../../../shared/contracts/moved-events.ts'
import type { Test } from '../../../shared/contracts/tests.ts'
import { engineVersion } from '../../../shared/mechanics/version.ts'
import type { Tx } from '../../db/database.ts'
import { madeWithNow } from '../clubs/measuring.service.ts'
import { findTrialToAnalyse } from './analyses.queries.ts'
import { inputsOf } from './inputs.ts'

/** What a trial would be analysed with now, but for the events that a person moved; null where there is no trial. */
export async function viewEngineInputs(
  tx: Tx,
  clubId: string,
  trialId: string,
): Promise<EngineInputs | null> {
  const trial = await findTrialToAnalyse(tx, clubId, trialId)
  if (!trial) return null
  const { test, changedSettings = {}, ...inputs } = inputsOf(trial, await madeWithNow(tx, clubId))
  const { recordedMassKg, gravity, calibrationU } = inputs
  return { engineVersion, test: test as Test, recordedMassKg, gravity, calibrationU, changedSettings }
}
