import type { Athlete } from '../../../shared/contracts/athletes.ts'
import type { Squad } from '../../../shared/contracts/squads.ts'
import type { StaleField } from '../../components/stale-notice.tsx'
import { formatDate } from '../../lib/format-date.ts'
import { squadNamesOf } from './squad-names.ts'

/** An athlete's fields in words, for showing what somebody else changed. */
export function athleteStaleFields(squads: Squad[]): StaleField<Athlete>[] {
  return [
    { label: 'Name', show: ({ name }) => name },
    { label: 'Born on', show: ({ bornOn }) => (bornOn === null ? 'empty' : formatDate(bornOn)) },
    {
      label: 'Recorded mass',
      show: ({ recordedMassKg }) => (recordedMassKg === null ? 'empty' : `${recordedMassKg} kg`),
    },
    { label: 'Squads', show: (athlete) => squadNamesOf(athlete, squads).join(', ') || 'none' },
    { label: 'Archived', show: ({ archived }) => (archived ? 'yes' : 'no') },
  ]
}
