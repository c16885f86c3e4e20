import { render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { StrictMode } from 'react'
import { createMemoryRouter, RouterProvider } from 'react-router-dom'
import type { Me } from '../../shared/contracts/account.ts'
import { Providers } from '../../src/app/providers.tsx'
import { routes } from '../../src/app/router.tsx'
import { meHandlers } from './msw/me.ts'
import { server } from './msw/server.ts'

/**
 * The whole client at an address, signed in as `me` (null: nobody), in strict mode as in development. What else the
 * server answers is for the test to say, with `server.use(…)`.
 */
export function renderApp(path: string, me: Me | null) {
  const { session, handlers } = meHandlers(me)
  server.use(...handlers)
  const router = createMemoryRouter(routes, { initialEntries: [path] })
  const user = userEvent.setup({ delay: null })
  const view = render(
    <StrictMode>
      <Providers>
        <RouterProvider router={router} />
      </Providers>
    </StrictMode>,
  )
  return {
    ...view,
    user,
    router,
    session,
    address: () => router.state.location.pathname + router.state.location.search,
  }
}

/** Waits for a page by its heading. */
export function pageTitled(title: string | RegExp) {
  return screen.findByRole('heading', { level: 1, name: title })
}
