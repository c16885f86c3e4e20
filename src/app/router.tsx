import type { ComponentType } from 'react'
import type { RouteObject } from 'react-router-dom'
import { measuringRoles, staffRoles, type Role } from '../../shared/contracts/roles.ts'
import { Loading } from '../components/loading.tsx'
import { paths } from '../lib/paths.ts'
import { HomeRedirect } from './home-redirect.tsx'
import { NotFoundPage } from './not-found-page.tsx'
import { OpenFrame } from './open-frame.tsx'
import { RequireRole } from './require-role.tsx'
import { RouteError } from './route-error.tsx'
import { Shell } from './shell.tsx'
import { SignedOutFrame } from './signed-out-frame.tsx'

/** A page in a script of its own, fetched when somebody first goes there. */
function page(path: string, load: () => Promise<ComponentType>): RouteObject {
  return { path, lazy: async () => ({ Component: await load() }), errorElement: <RouteError /> }
}

/** Pages for whoever holds one of these roles; anybody else reads why not. */
function only(roles: readonly Role[], children: RouteObject[]): RouteObject {
  return { element: <RequireRole roles={roles} />, children }
}

/** The router table: one line a page. */
export const routes: RouteObject[] = [
  {
    element: <SignedOutFrame />,
    hydrateFallbackElement: <Loading what="the page" />,
    errorElement: <RouteError framed />,
    children: [
      page(paths.signIn, async () => (await import('../pages/sign-in.tsx')).SignInPage),
      page(paths.invite, async () => (await import('../pages/invite.tsx')).InvitePage),
      page(paths.reset, async () => (await import('../pages/reset.tsx')).ResetPage),
      page(paths.finishReset, async () => (await import('../pages/finish-reset.tsx')).FinishResetPage),
    ],
  },
  {
    element: <OpenFrame />,
    hydrateFallbackElement: <Loading what="the page" />,
    errorElement: <RouteError framed />,
    children: [
      page(paths.methods, async () => (await import('../pages/methods.tsx')).MethodsPage),
      page(paths.method, async () => (await import('../pages/method-note.tsx')).MethodNotePage),
    ],
  },
  {
    element: <Shell />,
    hydrateFallbackElement: <Loading what="the page" />,
    errorElement: <RouteError framed />,
    children: [
      { path: paths.home, element: <HomeRedirect /> },
      page(paths.account, async () => (await import('../pages/account.tsx')).AccountPage),
      only(staffRoles, [
        page(paths.athletes, async () => (await import('../pages/athletes.tsx')).AthletesPage),
      ]),
      only(measuringRoles, [
        page(paths.sessions, async () => (await import('../pages/sessions.tsx')).SessionsPage),
        page(paths.newSession, async () => (await import('../pages/new-session.tsx')).NewSessionPage),
        page(paths.session, async () => (await import('../pages/session.tsx')).SessionPage),
        page(paths.athlete, async () => (await import('../pages/athlete.tsx')).AthletePage),
      ]),
      only(
        ['physio'],
        [page(paths.landingWatch, async () => (await import('../pages/landing-watch.tsx')).LandingWatchPage)],
      ),
      only(
        ['coach', 'physio', 'athlete'],
        [page(paths.trial, async () => (await import('../pages/trial.tsx')).TrialPage)],
      ),
      only(['athlete'], [page(paths.me, async () => (await import('../pages/me.tsx')).MePage)]),
      only(
        ['coach', 'admin'],
        [page(paths.squads, async () => (await import('../pages/club-squads.tsx')).ClubSquadsPage)],
      ),
      only(
        ['admin'],
        [
          page(paths.people, async () => (await import('../pages/club-people.tsx')).ClubPeoplePage),
          page(paths.seats, async () => (await import('../pages/club-seats.tsx')).ClubSeatsPage),
          page(paths.billing, async () => (await import('../pages/club-billing.tsx')).ClubBillingPage),
        ],
      ),
      only(staffRoles, [
        page(paths.settings, async () => (await import('../pages/club-settings.tsx')).ClubSettingsPage),
      ]),
      { path: '*', element: <NotFoundPage /> },
    ],
  },
]
