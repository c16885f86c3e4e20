import type { ComponentType } from 'react'
import type { RouteObject } from 'react-router-dom'
import type { Role } from '../../shared/contracts/roles.ts'
import { Loading } from '../components/loading.tsx'
import { paths } from '../lib/paths.ts'
import { HomeRedirect } from './home-redirect.tsx'
import { NotFoundPage } from './not-found-page.tsx'
import { RequireRole } from './require-role.tsx'
import { RouteError } from './route-error.tsx'
import { Shell } from './shell.tsx'
import { SignedOutFrame } from './signed-out-frame.tsx'

/** A page in a script of its own, fetched when somebody first goes there. */
function page(path: string, load: () => Promise<ComponentType>): RouteObject {
  return { path, lazy: async () => ({ Component: await load() }), errorElement: <RouteError /> }
}

/** Pages for whoever holds one of these roles; anybody else reads why not. */
export function only(roles: readonly Role[], children: RouteObject[]): RouteObject {
  return { element: <RequireRole roles={roles} />, children }
}

/** The router table: one line a page. */
export const routes: RouteObject[] = [
  {
    element: <SignedOutFrame />,
    hydrateFallbackElement: <Loading what="the page" />,
    errorElement: <RouteError />,
    children: [page(paths.signIn, async () => (await import('../pages/sign-in.tsx')).SignInPage)],
  },
  {
    element: <Shell />,
    hydrateFallbackElement: <Loading what="the page" />,
    errorElement: <RouteError />,
    children: [
      { path: paths.home, element: <HomeRedirect /> },
      { path: '*', element: <NotFoundPage /> },
    ],
  },
]
