import { lazy, Suspense, useState } from 'react'
import { Navigate, Outlet, ScrollRestoration, useLocation } from 'react-router-dom'
import { useMe } from '../api/account/get-me.ts'
import { ErrorState } from '../components/error-state.tsx'
import { Loading } from '../components/loading.tsx'
import { paths, signInPathFrom } from '../lib/paths.ts'
import { useSessionEnded } from './session-ended.ts'
import { TopBar } from './top-bar.tsx'
import { useFocusOnNewPage } from './use-focus-on-new-page.ts'

// A page that never loses its sign-in never fetches it.
const SessionEndedDialog = lazy(async () => ({
  default: (await import('../features/account/session-ended-dialog.tsx')).SessionEndedDialog,
}))

/** The frame of every signed-in page. */
export function Shell() {
  const me = useMe()
  const location = useLocation()
  const session = useSessionEnded()
  const main = useFocusOnNewPage()
  const [wasSignedIn, setWasSignedIn] = useState(false)
  if (me.data && !wasSignedIn) setWasSignedIn(true)

  if (me.data === undefined) {
    if (me.isError)
      return <ErrorState error={me.error} onRetry={() => void me.refetch()} retrying={me.isFetching} />
    return <Loading what="your club" />
  }
  // After a sign-out the page left behind is not for whoever signs in next.
  if (me.data === null) return <Navigate to={wasSignedIn ? paths.signIn : signInPathFrom(location)} replace />
  return (
    <>
      <TopBar me={me.data} />
      <main ref={main} id="page" tabIndex={-1} className="mx-auto max-w-[90rem] px-4 pb-16 md:px-8">
        <Suspense fallback={<Loading what="the page" />}>
          <Outlet />
        </Suspense>
      </main>
      <ScrollRestoration />
      {session.ended && (
        <Suspense fallback={null}>
          <SessionEndedDialog me={me.data} onSignedIn={session.settle} />
        </Suspense>
      )}
    </>
  )
}
