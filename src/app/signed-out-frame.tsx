import { Suspense } from 'react'
import { Link, Outlet } from 'react-router-dom'
import { Loading } from '../components/loading.tsx'
import { paths } from '../lib/paths.ts'
import { Wordmark } from './wordmark.tsx'

/** The frame of the pages that need no sign-in: one narrow sheet. */
export function SignedOutFrame() {
  return (
    <>
      <header className="border-b border-rule">
        <div className="mx-auto flex max-w-[28rem] items-end justify-between px-4">
          <Wordmark />
          <Link to={paths.methods} className="pt-3 pb-2.5">
            Methods
          </Link>
        </div>
      </header>
      <main className="mx-auto max-w-[28rem] px-4 pb-16">
        <Suspense fallback={<Loading what="the page" />}>
          <Outlet />
        </Suspense>
      </main>
    </>
  )
}
