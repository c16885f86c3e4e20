import { changeMeasuringSettings } from '../../../shared/contracts/measuring.ts'
import { recomputeKeys } from '../recomputes/recompute-keys.ts'
import { useAct } from '../use-act.ts'
import { measuringSettingsKey } from './club-keys.ts'

/** Analyses that were made with other settings are to be recomputed. */
export function useChangeMeasuringSettings() {
  return useAct(changeMeasuringSettings, { refreshes: [measuringSettingsKey, recomputeKeys.all] })
}
