import { Link } from 'react-router-dom'
import type { SessionSummary } from '../../../shared/contracts/sessions.ts'
import type { Column } from '../../components/table.tsx'
import { Tag } from '../../components/tag.tsx'
import { formatDateShort } from '../../lib/format-date.ts'
import { pathOf } from '../../lib/paths.ts'
import { testWords } from '../../lib/test-words.ts'

/** The columns of the list of sessions; the server orders it, newest first. */
export const sessionColumns: Column<SessionSummary>[] = [
  {
    key: 'title',
    head: 'Session',
    cell: (session) => <Link to={pathOf.session(session.id)}>{session.title}</Link>,
  },
  { key: 'date', head: 'Date', cell: (session) => formatDateShort(session.date) },
  { key: 'squads', head: 'Squads', cell: (session) => session.squadNames.join(', ') },
  { key: 'test', head: 'Test', cell: (session) => testWords(session.test) },
  {
    key: 'place',
    head: 'Place',
    cell: (session) => session.place,
    emptyFor: (session) => session.place === null,
  },
  { key: 'trials', head: 'Trials', cell: (session) => session.trials, figure: true },
  {
    key: 'state',
    head: 'State',
    cell: (session) => (
      <span className="inline-flex flex-wrap gap-1">
        {session.inTray > 0 && <Tag tone="caution">{session.inTray} in the Tray</Tag>}
        {session.publishedAt === null ? <Tag>not published</Tag> : 'published'}
      </span>
    ),
  },
]
