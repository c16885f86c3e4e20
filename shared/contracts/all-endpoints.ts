import * as account from './account.ts'
import * as analyses from './analyses.ts'
import * as athletes from './athletes.ts'
import * as clubs from './clubs.ts'
import * as billing from './billing.ts'
import * as downloads from './downloads.ts'
import type { Endpoint } from './endpoint.ts'
import * as events from './events.ts'
import * as landingWatch from './landing-watch.ts'
import * as measuring from './measuring.ts'
import * as people from './people.ts'
import * as recomputes from './recomputes.ts'
import * as results from './results.ts'
import * as seats from './seats.ts'
import * as sessions from './sessions.ts'
import * as squads from './squads.ts'
import * as trials from './trials.ts'
import * as uploads from './uploads.ts'

const isEndpoint = (value: unknown): value is Endpoint =>
  typeof value === 'object' && value !== null && 'method' in value && 'path' in value && 'access' in value

/** Every endpoint of the API by name: what the authorisation test walks. */
export const endpoints: Record<string, Endpoint> = Object.fromEntries(
  [
    account,
    people,
    squads,
    athletes,
    results,
    sessions,
    uploads,
    trials,
    downloads,
    analyses,
    recomputes,
    landingWatch,
    clubs,
    billing,
    seats,
    measuring,
    events,
  ]
    .flatMap((noun) => Object.entries(noun))
    .filter((entry): entry is [string, Endpoint] => isEndpoint(entry[1])),
)
