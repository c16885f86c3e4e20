import { useQueryClient } from '@tanstack/react-query'
import { Link, Navigate, useSearchParams } from 'react-router-dom'
import { startAs, useMe } from '../api/account/get-me.ts'
import { PageHead } from '../components/page-head.tsx'
import { Sheet } from '../components/sheet.tsx'
import { SignInForm } from '../features/account/sign-in-form.tsx'
import { paths, safeReturnPath } from '../lib/paths.ts'

export function SignInPage() {
  const queryClient = useQueryClient()
  const [params] = useSearchParams()
  const me = useMe().data

  if (me) return <Navigate to={safeReturnPath(params.get('from'))} replace />
  return (
    <>
      <PageHead title="Sign in" />
      <Sheet>
        <div className="flex flex-col gap-4 py-1">
          {params.has('from') && <p>Sign in to go on to the page you asked for.</p>}
          <SignInForm onSignedIn={(now) => startAs(queryClient, now)} />
          <p className="text-small">
            <Link to={paths.reset}>I do not know my password</Link>
          </p>
        </div>
      </Sheet>
      <p className="pt-4 text-small text-ink-2">
        Accounts come by invitation. If you should have one, ask your club’s admin.
      </p>
    </>
  )
}
