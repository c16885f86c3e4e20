import { useClubSettings } from '../api/clubs/get-club-settings.ts'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { SettingsForm } from '../features/clubs/settings-form.tsx'

export function ClubSettingsPage() {
  const settings = useClubSettings()
  return (
    <>
      <PageHead title="Settings" />
      <QueryState query={settings} what="the settings">
        {(current) => <SettingsForm settings={current} />}
      </QueryState>
    </>
  )
}
