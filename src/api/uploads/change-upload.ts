import { changeUpload, type Upload } from '../../../shared/contracts/uploads.ts'
import { sessionKeys } from '../sessions/session-keys.ts'
import { useAct } from '../use-act.ts'

/** Dismisses a file from the Tray, or takes it back; the sheet and the counts of the list are read again. */
export function useChangeUpload(onDone?: (upload: Upload) => void) {
  return useAct(changeUpload, { refreshes: [sessionKeys.all], ...(onDone ? { onDone } : {}) })
}
