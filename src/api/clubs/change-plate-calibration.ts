import { changePlateCalibration } from '../../../shared/contracts/measuring.ts'
import { recomputeKeys } from '../recomputes/recompute-keys.ts'
import { useAct } from '../use-act.ts'
import { plateCalibrationKey } from './club-keys.ts'

/** Analyses that were made with another calibration or gravity are to be recomputed. */
export function useChangePlateCalibration() {
  return useAct(changePlateCalibration, { refreshes: [plateCalibrationKey, recomputeKeys.all] })
}
