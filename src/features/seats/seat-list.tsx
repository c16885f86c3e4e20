import { foldName } from '../../../shared/contracts/names.ts'
import type { SeatLine } from '../../../shared/contracts/seats.ts'
import { useGiveSeat } from '../../api/seats/give-seat.ts'
import { useReleaseSeat } from '../../api/seats/release-seat.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { SelectField } from '../../components/field.tsx'
import { FormError } from '../../components/form-error.tsx'
import { ListBar, SortField } from '../../components/list-bar.tsx'
import { ListSheet } from '../../components/list-sheet.tsx'
import { SearchField } from '../../components/search-field.tsx'
import { countOf } from '../../lib/count-of.ts'
import { useListState } from '../../lib/use-list-state.ts'
import { seatColumns, seatStates, type SeatRow } from './seat-columns.tsx'

const defaults = { search: '', seat: '', sort: 'name' }

/** Every active athlete and their seat; giving and releasing can each be taken back by the other. */
export function SeatList({ athletes, timeZone }: { athletes: SeatLine[]; timeZone: string }) {
  const [list, setList] = useListState(defaults)
  const announce = useAnnounce()
  const give = useGiveSeat()
  const release = useReleaseSeat()
  const rows: SeatRow[] = athletes.map((line) => ({ ...line, id: line.athleteId }))
  const folded = foldName(list.search)
  const found = rows.filter(
    ({ name, state }) => foldName(name).includes(folded) && (list.seat === '' || state === list.seat),
  )
  const columns = seatColumns({
    timeZone,
    busy: give.isPending || release.isPending,
    onGive: ({ athleteId, name }) =>
      give.mutate(
        { body: { athleteId } },
        {
          onSuccess: ({ athletes: now }) => {
            const line = now.find((one) => one.athleteId === athleteId)
            announce({
              text: line ? `${name} ${seatStates[line.state]}.` : `${name} is not active any more.`,
            })
          },
        },
      ),
    onRelease: ({ athleteId, name }) =>
      release.mutate(
        { body: { athleteId } },
        { onSuccess: () => announce({ text: `${name} has no seat any more. All results are kept.` }) },
      ),
  })
  return (
    <>
      <FormError error={give.error ?? release.error} />
      <ListBar count={countOf(found.length, rows.length, 'athlete')}>
        <SearchField label="Search by name" value={list.search} onChange={(search) => setList({ search })} />
        <SelectField
          label="Seat"
          className="sm:w-52"
          value={list.seat}
          onChange={(event) => setList({ seat: event.target.value })}
        >
          <option value="">All</option>
          {Object.entries(seatStates).map(([state, words]) => (
            <option key={state} value={state}>
              {words}
            </option>
          ))}
        </SelectField>
        <SortField columns={columns} value={list.sort} onChange={(sort) => setList({ sort })} />
      </ListBar>
      <ListSheet
        caption="Athletes and their seats"
        columns={columns}
        rows={found}
        sort={list.sort}
        onSort={(sort) => setList({ sort })}
        none={{ title: 'Nobody fits', back: 'Show all athletes', onBack: () => setList(defaults) }}
      />
    </>
  )
}
