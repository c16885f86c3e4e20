import { changeClubSettings } from '../../../shared/contracts/clubs.ts'
import { landingWatchKeys } from '../landing-watch/landing-watch-keys.ts'
import { useAct } from '../use-act.ts'
import { clubSettingsKey } from './get-club-settings.ts'

/** A limit decides what the Landing watch lists. */
export function useChangeClubSettings() {
  return useAct(changeClubSettings, { refreshes: [clubSettingsKey, landingWatchKeys.all] })
}
