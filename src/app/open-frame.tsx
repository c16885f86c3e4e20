import { Suspense } from 'react'
import { Link, Outlet, ScrollRestoration, useLocation } from 'react-router-dom'
import { useMe } from '../api/account/get-me.ts'
import { Loading } from '../components/loading.tsx'
import { signInPathFrom } from '../lib/paths.ts'
import { Shell } from './shell.tsx'
import { useFocusOnNewPage } from './use-focus-on-new-page.ts'
import { Wordmark } from './wordmark.tsx'

/** The frame of pages that anybody may read: the shell for whoever is signed in, a plain head for others. */
export function OpenFrame() {
  const me = useMe()
  if (me.data) return <Shell />
  if (me.isPending) return <Loading what="the page" />
  return <ReadersFrame />
}

function ReadersFrame() {
  const location = useLocation()
  const main = useFocusOnNewPage()
  return (
    <>
      <header className="no-print border-b border-rule">
        <div className="mx-auto flex max-w-[90rem] items-end justify-between px-4 md:px-8">
          <Wordmark />
          <Link to={signInPathFrom(location)} className="pt-3 pb-2.5">
            Sign in
          </Link>
        </div>
      </header>
      <main ref={main} id="page" tabIndex={-1} className="mx-auto max-w-[90rem] px-4 pb-16 md:px-8">
        <Suspense fallback={<Loading what="the page" />}>
          <Outlet />
        </Suspense>
      </main>
      <ScrollRestoration />
    </>
  )
}
