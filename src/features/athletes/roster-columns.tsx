import { Link } from 'react-router-dom'
import type { Athlete } from '../../../shared/contracts/athletes.ts'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { Button } from '../../components/button.tsx'
import type { Column } from '../../components/table.tsx'
import { Tag } from '../../components/tag.tsx'
import { formatDateShort } from '../../lib/format-date.ts'
import { formatNumber } from '../../lib/format-figure.ts'
import { pathOf } from '../../lib/paths.ts'
import { compareNumbers, compareText } from '../../lib/sort-rows.ts'
import { squadNamesOf } from './squad-names.ts'

interface RosterActs {
  mayOpen: boolean
  mayChange: boolean
  onChange: (athlete: Athlete) => void
  onArchive: (athlete: Athlete) => void
}

export function rosterColumns(squads: Squad[], acts: RosterActs): Column<Athlete>[] {
  const columns: Column<Athlete>[] = [
    {
      key: 'name',
      head: 'Athlete',
      cell: ({ id, name, archived }) => (
        <>
          {acts.mayOpen ? <Link to={pathOf.athlete(id)}>{name}</Link> : name}{' '}
          {archived && <Tag>archived</Tag>}
        </>
      ),
      compare: (a, b) => compareText(a.name, b.name),
    },
    {
      key: 'squads',
      head: 'Squads',
      cell: (athlete) => squadNamesOf(athlete, squads).join(', '),
      emptyFor: (athlete) => squadNamesOf(athlete, squads).length === 0,
    },
    {
      key: 'born',
      head: 'Born',
      cell: ({ bornOn }) => (bornOn === null ? '' : formatDateShort(bornOn)),
      compare: (a, b) => compareText(a.bornOn ?? '9999', b.bornOn ?? '9999'),
      figure: true,
      emptyFor: ({ bornOn }) => bornOn === null,
    },
    {
      key: 'mass',
      head: 'Recorded mass, kg',
      cell: ({ recordedMassKg }) => (recordedMassKg === null ? '' : formatNumber(recordedMassKg, 1)),
      compare: (a, b) => compareNumbers(a.recordedMassKg, b.recordedMassKg),
      figure: true,
      emptyFor: ({ recordedMassKg }) => recordedMassKg === null,
    },
    {
      key: 'signs-in',
      head: 'Signs in',
      cell: ({ linked }) => (linked ? 'yes' : 'no'),
    },
  ]
  return acts.mayChange ? [...columns, actsColumn(acts)] : columns
}

function actsColumn({ onChange, onArchive }: RosterActs): Column<Athlete> {
  return {
    key: 'acts',
    head: '',
    label: 'Acts',
    cell: (athlete) => (
      <span className="flex gap-4 sm:justify-end">
        <Button look="word" aria-label={`Change ${athlete.name}`} onClick={() => onChange(athlete)}>
          Change
        </Button>
        <Button
          look="word"
          aria-label={`${athlete.archived ? 'Bring back' : 'Archive'} ${athlete.name}`}
          onClick={() => onArchive(athlete)}
        >
          {athlete.archived ? 'Bring back' : 'Archive'}
        </Button>
      </span>
    ),
  }
}
