import { Link } from 'react-router-dom'
import { paths } from '../lib/paths.ts'

export function Wordmark({ clubName }: { clubName?: string }) {
  return (
    <Link to={paths.home} className="flex items-baseline gap-2 border-b-3 border-ink pt-3 pb-2 no-underline">
      <span className="text-panel font-semibold">Underfoot</span>
      {clubName !== undefined && <span className="hidden text-small text-ink-2 sm:inline">{clubName}</span>}
    </Link>
  )
}
