import { Link } from 'react-router-dom'
import { useSeats } from '../api/clubs/get-seats.ts'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { SeatsSheet } from '../features/clubs/seats-sheet.tsx'
import { paths } from '../lib/paths.ts'

export function ClubSeatsPage() {
  const seats = useSeats()
  return (
    <>
      <PageHead title="Seats" />
      <QueryState query={seats} what="the seats">
        {(figures) => <SeatsSheet {...figures} />}
      </QueryState>
      <p className="max-w-prose pt-4 text-ink-2">
        A seat is an active athlete; coaches, physios and admins need none. To free one, archive an athlete on{' '}
        <Link to={paths.athletes}>the roster</Link>: their results are kept.
      </p>
    </>
  )
}
