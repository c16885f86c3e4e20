import { getClubSettings } from '../../shared/contracts/clubs.ts'
import { useRoles } from '../api/account/get-me.ts'
import { useClubSettings } from '../api/clubs/get-club-settings.ts'
import { useMeasuringSettings } from '../api/clubs/get-measuring-settings.ts'
import { usePlateCalibration } from '../api/clubs/get-plate-calibration.ts'
import { useClubEvents } from '../api/events/use-club-events.ts'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { Sheet } from '../components/sheet.tsx'
import { MeasuringForm } from '../features/clubs/measuring-form.tsx'
import { PlatesForm } from '../features/clubs/plates-form.tsx'
import { SettingsForm } from '../features/clubs/settings-form.tsx'
import { GuardUnsaved } from '../features/clubs/unsaved.tsx'
import { RecomputePanel } from '../features/recomputes/recompute-panel.tsx'
import { recomputeAnchor } from '../features/recomputes/stale-line.tsx'
import { mayCall } from '../lib/may-call.ts'

export function ClubSettingsPage() {
  const mayLimit = mayCall(getClubSettings, useRoles())
  const plates = usePlateCalibration()
  const measuring = useMeasuringSettings()
  useClubEvents()
  return (
    <GuardUnsaved>
      <PageHead title="Settings" />
      <div className="flex flex-col gap-8">
        {mayLimit && <Limits />}
        <QueryState query={plates} what="plates and place">
          {(calibration) => <PlatesForm calibration={calibration} />}
        </QueryState>
        <QueryState query={measuring} what="the measuring settings">
          {(settings) => <MeasuringForm settings={settings} />}
        </QueryState>
        <div id={recomputeAnchor} tabIndex={-1}>
          <Sheet title="Recompute" titleAside="one session or athlete: from its page">
            <RecomputePanel scope={{ kind: 'club' }} />
          </Sheet>
        </div>
      </div>
    </GuardUnsaved>
  )
}

function Limits() {
  const settings = useClubSettings()
  return (
    <QueryState query={settings} what="the settings">
      {(current) => <SettingsForm settings={current} />}
    </QueryState>
  )
}
