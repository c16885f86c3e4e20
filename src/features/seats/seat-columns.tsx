import type { SeatLine } from '../../../shared/contracts/seats.ts'
import { Button } from '../../components/button.tsx'
import type { Column } from '../../components/table.tsx'
import { Tag } from '../../components/tag.tsx'
import { formatMoment } from '../../lib/format-date.ts'

/** As lists want their rows. */
export type SeatRow = SeatLine & { id: string }

export const seatStates: Record<SeatLine['state'], string> = {
  seated: 'has a seat',
  over: 'beyond the paid seats',
  waiting: 'waits for a seat',
  cooling: 'released',
  none: 'no seat',
}

interface SeatActs {
  timeZone: string
  busy: boolean
  onGive: (row: SeatRow) => void
  onRelease: (row: SeatRow) => void
}

export function seatColumns({ timeZone, busy, onGive, onRelease }: SeatActs): Column<SeatRow>[] {
  const when = ({ since, freesAt, state }: SeatRow) => {
    if (state === 'cooling' && freesAt) return `free on ${formatMoment(freesAt, timeZone)}`
    return since ? `since ${formatMoment(since, timeZone)}` : ''
  }
  return [
    {
      key: 'name',
      head: 'Athlete',
      cell: ({ name }) => name,
      compare: (a, b) => a.name.localeCompare(b.name),
    },
    {
      key: 'state',
      head: 'Seat',
      cell: ({ state }) =>
        state === 'over' ? <Tag tone="caution">{seatStates[state]}</Tag> : seatStates[state],
      compare: (a, b) => seatStates[a.state].localeCompare(seatStates[b.state]),
    },
    {
      key: 'since',
      head: 'When',
      cell: when,
      compare: (a, b) => (a.since ?? '').localeCompare(b.since ?? ''),
      emptyFor: (row) => when(row) === '',
    },
    {
      key: 'acts',
      head: '',
      label: 'Acts',
      cell: (row) => {
        const gives = row.state === 'none' || row.state === 'cooling'
        const words =
          row.state === 'waiting' ? 'Take off the list' : gives ? 'Give a seat' : 'Release the seat'
        return (
          <Button
            look="word"
            busy={busy}
            aria-label={`${words}: ${row.name}`}
            onClick={() => (gives ? onGive(row) : onRelease(row))}
          >
            {words}
          </Button>
        )
      },
    },
  ]
}
