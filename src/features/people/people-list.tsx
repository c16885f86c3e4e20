import { useState } from 'react'
import { foldName } from '../../../shared/contracts/names.ts'
import type { Person } from '../../../shared/contracts/people.ts'
import { roles as allRoles, type Role } from '../../../shared/contracts/roles.ts'
import { SelectField } from '../../components/field.tsx'
import { ListBar, SortField } from '../../components/list-bar.tsx'
import { ListSheet } from '../../components/list-sheet.tsx'
import { SearchField } from '../../components/search-field.tsx'
import { countOf } from '../../lib/count-of.ts'
import { roleNames } from '../../lib/role-names.ts'
import { useListState } from '../../lib/use-list-state.ts'
import { ChangeRolesDialog } from './change-roles-dialog.tsx'
import { DeactivateDialog } from './deactivate-dialog.tsx'
import { peopleColumns } from './people-columns.tsx'

const defaults = { search: '', role: '', show: 'active', sort: 'name' }

export function PeopleList({ people }: { people: Person[] }) {
  const [list, setList] = useListState(defaults)
  const [changingRoles, setChangingRoles] = useState<Person | null>(null)
  const [deactivating, setDeactivating] = useState<Person | null>(null)
  const columns = peopleColumns({ onChangeRoles: setChangingRoles, onDeactivate: setDeactivating })
  const ofShow = people.filter(({ active }) => list.show === 'all' || active === (list.show === 'active'))
  const found = ofShow.filter(fits(list))

  return (
    <>
      <ListBar count={countOf(found.length, ofShow.length, 'account')}>
        <SearchField
          label="Search by name or address"
          value={list.search}
          onChange={(search) => setList({ search })}
        />
        <SelectField
          label="Role"
          className="sm:w-40"
          value={list.role}
          onChange={(event) => setList({ role: event.target.value })}
        >
          <option value="">All roles</option>
          {allRoles.map((role) => (
            <option key={role} value={role}>
              {roleNames[role]}
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
          <option value="deactivated">Deactivated</option>
          <option value="all">All</option>
        </SelectField>
        <SortField columns={columns} value={list.sort} onChange={(sort) => setList({ sort })} />
      </ListBar>
      <ListSheet
        caption="People"
        columns={columns}
        rows={found}
        sort={list.sort}
        onSort={(sort) => setList({ sort })}
        none={{
          title: 'Nobody fits',
          back: 'Show all active people',
          onBack: () => setList(defaults),
        }}
      />
      {changingRoles && <ChangeRolesDialog person={changingRoles} onClose={() => setChangingRoles(null)} />}
      {deactivating && <DeactivateDialog person={deactivating} onClose={() => setDeactivating(null)} />}
    </>
  )
}

function fits({ search, role }: typeof defaults): (person: Person) => boolean {
  const folded = foldName(search)
  return ({ name, email, roles }) =>
    (role === '' || roles.includes(role as Role)) &&
    (foldName(name).includes(folded) || email.includes(search.trim().toLowerCase()))
}
