import { useState } from 'react'
import { changeAthlete, getAthlete, type Athlete } from '../../../shared/contracts/athletes.ts'
import { foldName } from '../../../shared/contracts/names.ts'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { useRoles } from '../../api/account/get-me.ts'
import { SelectField } from '../../components/field.tsx'
import { ListBar, SortField } from '../../components/list-bar.tsx'
import { ListSheet } from '../../components/list-sheet.tsx'
import { SearchField } from '../../components/search-field.tsx'
import { countOf } from '../../lib/count-of.ts'
import { mayCall } from '../../lib/may-call.ts'
import { useListState } from '../../lib/use-list-state.ts'
import { ChangeAthleteDialog } from './change-athlete-dialog.tsx'
import { rosterColumns } from './roster-columns.tsx'
import { useArchiveAthlete } from './use-archive-athlete.ts'

const defaults = { search: '', squad: '', show: 'active', sort: 'name' }

/** The club's athletes: search, filter by squad, sort, change, archive. */
export function Roster({ athletes, squads }: { athletes: Athlete[]; squads: Squad[] }) {
  const [list, setList] = useListState(defaults)
  const [changing, setChanging] = useState<Athlete | null>(null)
  const archive = useArchiveAthlete()
  const roles = useRoles()
  const current = squads.filter((squad) => !squad.archived)
  const columns = rosterColumns(squads, {
    mayOpen: mayCall(getAthlete, roles),
    mayChange: mayCall(changeAthlete, roles),
    onChange: setChanging,
    onArchive: archive,
  })
  const shown = athletes.filter(fits(list))

  return (
    <>
      <ListBar
        count={countOf(
          shown.length,
          athletes.filter(fits({ ...defaults, show: list.show })).length,
          'athlete',
        )}
      >
        <SearchField label="Search by name" value={list.search} onChange={(search) => setList({ search })} />
        <SelectField
          label="Squad"
          className="sm:w-44"
          value={list.squad}
          onChange={(event) => setList({ squad: event.target.value })}
        >
          <option value="">All squads</option>
          {current.map(({ id, name }) => (
            <option key={id} value={id}>
              {name}
            </option>
          ))}
        </SelectField>
        <SelectField
          label="Show"
          className="sm:w-36"
          value={list.show}
          onChange={(event) => setList({ show: event.target.value })}
        >
          <option value="active">Active</option>
          <option value="archived">Archived</option>
          <option value="all">All</option>
        </SelectField>
        <SortField columns={columns} value={list.sort} onChange={(sort) => setList({ sort })} />
      </ListBar>
      <ListSheet
        caption="Athletes"
        columns={columns}
        rows={shown}
        sort={list.sort}
        onSort={(sort) => setList({ sort })}
        none={{
          title: 'No athlete fits',
          back: 'Show all active athletes',
          onBack: () => setList(defaults),
        }}
      />
      {changing && (
        <ChangeAthleteDialog athlete={changing} squads={current} onClose={() => setChanging(null)} />
      )}
    </>
  )
}

function fits({ search, squad, show }: typeof defaults): (athlete: Athlete) => boolean {
  const words = foldName(search).split(' ')
  return ({ name, squadIds, archived }) =>
    (show === 'all' || archived === (show === 'archived')) &&
    (squad === '' || squadIds.includes(squad)) &&
    words.every((word) => foldName(name).includes(word))
}
