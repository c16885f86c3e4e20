import { useState } from 'react'
import type { Athlete } from '../../../shared/contracts/athletes.ts'
import { foldName } from '../../../shared/contracts/names.ts'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { SelectField } from '../../components/field.tsx'
import { ListBar, SortField } from '../../components/list-bar.tsx'
import { ListSheet } from '../../components/list-sheet.tsx'
import { SearchField } from '../../components/search-field.tsx'
import { countOf } from '../../lib/count-of.ts'
import { useListState } from '../../lib/use-list-state.ts'
import { ChangeSquadDialog } from './change-squad-dialog.tsx'
import { squadColumns } from './squad-columns.tsx'
import { useArchiveSquad } from './use-archive-squad.ts'

const defaults = { search: '', show: 'active', sort: 'name' }

export function SquadList({ squads, athletes }: { squads: Squad[]; athletes: Athlete[] }) {
  const [list, setList] = useListState(defaults)
  const [changing, setChanging] = useState<Squad | null>(null)
  const archive = useArchiveSquad()
  const columns = squadColumns({ onChange: setChanging, onArchive: archive })
  const ofShow = squads.filter(
    ({ archived }) => list.show === 'all' || archived === (list.show === 'archived'),
  )
  const found = ofShow.filter(({ name }) => foldName(name).includes(foldName(list.search)))

  return (
    <>
      <ListBar count={countOf(found.length, ofShow.length, 'squad')}>
        <SearchField label="Search by name" value={list.search} onChange={(search) => setList({ search })} />
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
        caption="Squads"
        columns={columns}
        rows={found}
        sort={list.sort}
        onSort={(sort) => setList({ sort })}
        none={{
          title: 'No squad fits',
          back: 'Show all active squads',
          onBack: () => setList(defaults),
        }}
      />
      {changing && (
        <ChangeSquadDialog squad={changing} athletes={athletes} onClose={() => setChanging(null)} />
      )}
    </>
  )
}
