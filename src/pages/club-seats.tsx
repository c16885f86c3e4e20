import { Link } from 'react-router-dom'
import { useMe } from '../api/account/get-me.ts'
import { useSeats } from '../api/clubs/get-seats.ts'
import { useSeatPlan } from '../api/seats/get-seat-plan.ts'
import { EmptyState } from '../components/empty-state.tsx'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { Sheet } from '../components/sheet.tsx'
import { SeatList } from '../features/seats/seat-list.tsx'
import { SeatsSheet } from '../features/seats/seats-sheet.tsx'
import { limits } from '../../shared/contracts/limits.ts'
import { paths } from '../lib/paths.ts'

export function ClubSeatsPage() {
  const me = useMe()
  const plan = useSeatPlan()
  const seats = useSeats()
  return (
    <>
      <PageHead title="Seats" />
      <QueryState query={plan} what="the seats">
        {(shown) => (
          <div className="flex flex-col gap-6">
            <SeatsSheet plan={shown} staff={seats.data?.staff ?? 0} />
            <p className="max-w-prose text-ink-2">
              A seat is an active athlete; coaches, physios and admins need none. The seat of somebody who was
              measured stays theirs for {limits.seatCoolingDays} days from its giving, also when it is
              released earlier. Archiving an athlete on <Link to={paths.athletes}>the roster</Link> releases
              their seat; results are always kept.
            </p>
            {shown.athletes.length === 0 ? (
              <Sheet>
                <EmptyState title="No athletes yet">Enter them on the roster; each gets a seat.</EmptyState>
              </Sheet>
            ) : (
              <div>
                <SeatList athletes={shown.athletes} timeZone={me.data?.club.timeZone ?? 'UTC'} />
              </div>
            )}
          </div>
        )}
      </QueryState>
    </>
  )
}
