import type { Route } from './http/implement.ts'
import { accountRoutes } from './modules/account/account.routes.ts'
import { analysisRoutes } from './modules/analyses/analyses.routes.ts'
import { athleteRoutes } from './modules/athletes/athletes.routes.ts'
import { billingRoutes } from './modules/billing/billing.routes.ts'
import { clubRoutes } from './modules/clubs/clubs.routes.ts'
import { downloadRoutes } from './modules/downloads/downloads.routes.ts'
import { eventRoutes } from './modules/events/events.routes.ts'
import { landingWatchRoutes } from './modules/landing-watch/landing-watch.routes.ts'
import { peopleRoutes } from './modules/people/people.routes.ts'
import { recomputeRoutes } from './modules/recomputes/recomputes.routes.ts'
import { resultRoutes } from './modules/results/results.routes.ts'
import { seatRoutes } from './modules/seats/seats.routes.ts'
import { sessionRoutes } from './modules/sessions/sessions.routes.ts'
import { squadRoutes } from './modules/squads/squads.routes.ts'
import { trialRoutes } from './modules/trials/trials.routes.ts'
import { uploadRoutes } from './modules/uploads/uploads.routes.ts'

/** Every route of the API. */
export const routes: Route[] = [
  ...accountRoutes,
  ...peopleRoutes,
  ...squadRoutes,
  ...athleteRoutes,
  ...resultRoutes,
  ...sessionRoutes,
  ...uploadRoutes,
  ...trialRoutes,
  ...downloadRoutes,
  ...landingWatchRoutes,
  ...analysisRoutes,
  ...recomputeRoutes,
  ...clubRoutes,
  ...billingRoutes,
  ...seatRoutes,
  ...eventRoutes,
]
