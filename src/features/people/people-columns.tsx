import type { Person } from '../../../shared/contracts/people.ts'
import { Button } from '../../components/button.tsx'
import type { Column } from '../../components/table.tsx'
import { Tag } from '../../components/tag.tsx'
import { roleNames } from '../../lib/role-names.ts'
import { compareText } from '../../lib/sort-rows.ts'

interface PeopleActs {
  onChangeRoles: (person: Person) => void
  onDeactivate: (person: Person) => void
}

const rolesOf = ({ roles }: Person) => roles.map((role) => roleNames[role]).join(', ')

export function peopleColumns({ onChangeRoles, onDeactivate }: PeopleActs): Column<Person>[] {
  return [
    {
      key: 'name',
      head: 'Name',
      cell: ({ name, active }) => (
        <>
          {name} {!active && <Tag>deactivated</Tag>}
        </>
      ),
      compare: (a, b) => compareText(a.name, b.name),
    },
    {
      key: 'email',
      head: 'E-mail address',
      cell: ({ email }) => email,
      compare: (a, b) => compareText(a.email, b.email),
    },
    { key: 'roles', head: 'Roles', cell: rolesOf, compare: (a, b) => compareText(rolesOf(a), rolesOf(b)) },
    {
      key: 'acts',
      head: '',
      label: 'Acts',
      cell: (person) => (
        <span className="flex gap-4 sm:justify-end">
          <Button look="word" aria-label={`Roles of ${person.name}`} onClick={() => onChangeRoles(person)}>
            Roles
          </Button>
          <Button
            look="word"
            aria-label={person.active ? `Deactivate ${person.name}` : `Let ${person.name} in again`}
            onClick={() => onDeactivate(person)}
          >
            {person.active ? 'Deactivate' : 'Let in again'}
          </Button>
        </span>
      ),
    },
  ]
}
