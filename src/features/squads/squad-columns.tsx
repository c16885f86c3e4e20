import { Link } from 'react-router-dom'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { Button } from '../../components/button.tsx'
import type { Column } from '../../components/table.tsx'
import { Tag } from '../../components/tag.tsx'
import { paths } from '../../lib/paths.ts'
import { compareText } from '../../lib/sort-rows.ts'

interface SquadActs {
  onChange: (squad: Squad) => void
  onArchive: (squad: Squad) => void
}

export function squadColumns({ onChange, onArchive }: SquadActs): Column<Squad>[] {
  return [
    {
      key: 'name',
      head: 'Squad',
      cell: ({ id, name, archived }) =>
        archived ? (
          <>
            {name} <Tag>archived</Tag>
          </>
        ) : (
          <Link to={`${paths.athletes}?squad=${id}`}>{name}</Link>
        ),
      compare: (a, b) => compareText(a.name, b.name),
    },
    {
      key: 'athletes',
      head: 'Athletes',
      cell: ({ athleteIds }) => athleteIds.length,
      compare: (a, b) => a.athleteIds.length - b.athleteIds.length,
      figure: true,
    },
    {
      key: 'acts',
      head: '',
      label: 'Acts',
      cell: (squad) => (
        <span className="flex gap-4 sm:justify-end">
          <Button look="word" aria-label={`Change ${squad.name}`} onClick={() => onChange(squad)}>
            Change
          </Button>
          <Button
            look="word"
            aria-label={`${squad.archived ? 'Bring back' : 'Archive'} ${squad.name}`}
            onClick={() => onArchive(squad)}
          >
            {squad.archived ? 'Bring back' : 'Archive'}
          </Button>
        </span>
      ),
    },
  ]
}
