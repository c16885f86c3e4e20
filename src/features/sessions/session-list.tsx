import { Button, ButtonLink } from '../../components/button.tsx'
import { EmptyState } from '../../components/empty-state.tsx'
import { SelectField } from '../../components/field.tsx'
import { ListBar } from '../../components/list-bar.tsx'
import { QueryState } from '../../components/query-state.tsx'
import { SearchField } from '../../components/search-field.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { Table } from '../../components/table.tsx'
import { useSessions } from '../../api/sessions/list-sessions.ts'
import { useSquads } from '../../api/squads/list-squads.ts'
import { counted } from '../../lib/counted.ts'
import { paths } from '../../lib/paths.ts'
import { useListState } from '../../lib/use-list-state.ts'
import { sessionColumns } from './session-columns.tsx'

/** The club's sessions, newest first: searched, by squad, page by page, all of it in the address. */
export function SessionList() {
  const [state, change] = useListState({ search: '', squad: '', page: '1' })
  const page = Math.max(1, Math.floor(Number(state.page)) || 1)
  const squads = useSquads().data ?? []
  const sessions = useSessions({ search: state.search || undefined, squadId: state.squad || undefined, page })
  const filtered = state.search !== '' || state.squad !== ''
  return (
    <>
      <ListBar count={sessions.data ? counted(sessions.data.total, 'session') : ''}>
        <SearchField
          label="Search title or place"
          value={state.search}
          onChange={(search) => change({ search, page: '1' })}
        />
        <SelectField
          label="Squad"
          className="sm:w-56"
          value={state.squad}
          onChange={(event) => change({ squad: event.target.value, page: '1' })}
        >
          <option value="">All squads</option>
          {squads.map((squad) => (
            <option key={squad.id} value={squad.id}>
              {squad.name}
            </option>
          ))}
        </SelectField>
      </ListBar>
      <Sheet flush>
        <QueryState query={sessions} what="the sessions">
          {(list) =>
            list.sessions.length === 0 ? (
              <NoSessions filtered={filtered} onClear={() => change({ search: '', squad: '', page: '1' })} />
            ) : (
              <Table
                caption="Sessions"
                columns={sessionColumns}
                rows={list.sessions}
                rowKey={(session) => session.id}
              />
            )
          }
        </QueryState>
      </Sheet>
      {sessions.data && (
        <Pages page={page} pages={sessions.data.pages} onPage={(next) => change({ page: String(next) })} />
      )}
    </>
  )
}

function NoSessions({ filtered, onClear }: { filtered: boolean; onClear: () => void }) {
  if (filtered) {
    return (
      <EmptyState title="No session matches" action={<Button onClick={onClear}>Show all sessions</Button>}>
        Search looks in titles and places.
      </EmptyState>
    )
  }
  return (
    <EmptyState title="No sessions yet" action={<ButtonLink to={paths.newSession}>New session</ButtonLink>}>
      A session holds one test day of one or more squads: make it, then drop the plates’ files on it.
    </EmptyState>
  )
}

function Pages({ page, pages, onPage }: { page: number; pages: number; onPage: (page: number) => void }) {
  if (pages <= 1) return null
  return (
    <nav aria-label="Pages of the list" className="flex items-center gap-4 pt-4">
      <Button disabled={page <= 1} onClick={() => onPage(page - 1)}>
        Newer
      </Button>
      <span>
        Page {page} of {pages}
      </span>
      <Button disabled={page >= pages} onClick={() => onPage(page + 1)}>
        Older
      </Button>
    </nav>
  )
}
