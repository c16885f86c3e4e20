import { Suspense } from 'react'
import { Outlet } from 'react-router-dom'
import { Loading } from '../components/loading.tsx'
import { Wordmark } from './wordmark.tsx'

/** The frame of the pages that need no sign-in: one narrow sheet. */
export function SignedOutFrame() {
  return (
    <>
      <header className="border-b border-rule">
        <div className="mx-auto flex max-w-[28rem] px-4">
          <Wordmark />
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
