import type { ClubSettings } from '../../../shared/contracts/clubs.ts'
import { Protocol, protocolNames } from '../../../shared/contracts/tests.ts'
import type { StaleField } from '../../components/stale-notice.tsx'

export const settingsStaleFields: StaleField<ClubSettings>[] = Protocol.options.map((protocol) => ({
  label: protocolNames[protocol],
  show: ({ landingPeakLimits }) => {
    const limit = landingPeakLimits[protocol]
    return limit === undefined ? 'no limit' : `${limit} body weights`
  },
}))
