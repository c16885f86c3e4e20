import { useClubEvents } from '../api/events/use-club-events.ts'
import { useMyResults } from '../api/results/get-my-results.ts'
import { EmptyState } from '../components/empty-state.tsx'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { Sheet } from '../components/sheet.tsx'
import { OwnResults } from '../features/results/own-results.tsx'

export function MePage() {
  const mine = useMyResults()
  useClubEvents()
  return (
    <>
      <PageHead title="My results" />
      <QueryState query={mine} what="your results">
        {({ athlete, results }) => {
          const newest = results.at(-1)
          if (newest) return <OwnResults results={results} newest={newest} />
          return (
            <Sheet flush>
              {athlete ? (
                <EmptyState title="No results yet">
                  Once your coach publishes a session that you jumped in, your results stand here.
                </EmptyState>
              ) : (
                <EmptyState title="You are not tied to an athlete of the club yet">
                  Ask a club admin to invite you as the athlete you are; your results stand here then.
                </EmptyState>
              )}
            </Sheet>
          )
        }}
      </QueryState>
    </>
  )
}
