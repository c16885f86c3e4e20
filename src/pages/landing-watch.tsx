import { useClubEvents } from '../api/events/use-club-events.ts'
import { useHighLandings } from '../api/landing-watch/list-high-landings.ts'
import { SelectField } from '../components/field.tsx'
import { ListBar } from '../components/list-bar.tsx'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { HighLandings } from '../features/landing-watch/high-landings.tsx'
import { counted } from '../lib/counted.ts'
import { useListState } from '../lib/use-list-state.ts'

const periods = ['30', '90', '365']

export function LandingWatchPage() {
  const [state, change] = useListState({ days: '90' })
  const days = periods.includes(state.days) ? Number(state.days) : 90
  const watch = useHighLandings(days)
  useClubEvents()
  return (
    <>
      <PageHead title="Landing watch" />
      <ListBar count={watch.data ? counted(watch.data.landings.length, 'landing') : ''}>
        <SelectField
          label="Tests of the last"
          value={String(days)}
          onChange={(event) => change({ days: event.target.value })}
        >
          {periods.map((period) => (
            <option key={period} value={period}>
              {period} days
            </option>
          ))}
        </SelectField>
      </ListBar>
      <QueryState query={watch} what="the landings">
        {(found) => <HighLandings watch={found} days={days} />}
      </QueryState>
    </>
  )
}
