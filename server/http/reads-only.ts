import type { Endpoint } from '../../shared/contracts/endpoint.ts'
import type { Caller } from './caller.ts'
import { namedError } from './errors.ts'

const clubReadsOnly = (since: Date) =>
  namedError(
    'club-reads-only',
    402,
    'Since its subscription ended or could not be charged, the club only reads. Everything is kept; an admin opens it again under Billing.',
    { since: since.toISOString() },
  )

/** The one place that refuses changes to a club whose subscription has lapsed; reading goes on, and so does paying. */
export function refuseWhileReadingOnly(
  { method, whileReadingOnly }: Pick<Endpoint, 'method' | 'whileReadingOnly'>,
  { readsOnlyFrom }: Pick<Caller, 'readsOnlyFrom'>,
  now: Date,
): void {
  if (method === 'GET' || whileReadingOnly === 'allowed') return
  if (readsOnlyFrom && readsOnlyFrom <= now) throw clubReadsOnly(readsOnlyFrom)
}
