import { useState } from 'react'
import { Link, useParams } from 'react-router-dom'
import { useReset } from '../api/account/check-reset.ts'
import { isApiError } from '../api/api-error.ts'
import { ButtonLink } from '../components/button.tsx'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { Sheet } from '../components/sheet.tsx'
import { FinishResetForm } from '../features/account/finish-reset-form.tsx'
import { paths } from '../lib/paths.ts'

export function FinishResetPage() {
  const { token = '' } = useParams()
  const reset = useReset(token)
  const [done, setDone] = useState(false)
  return (
    <>
      <PageHead title="Choose a new password" />
      <Sheet>
        {done ? (
          <div className="flex flex-col items-start gap-4 py-1">
            <p role="status">The new password is set. Wherever you were signed in, you are signed out now.</p>
            <ButtonLink to={paths.signIn} look="main">
              Sign in
            </ButtonLink>
          </div>
        ) : (
          <QueryState query={reset} what="the link">
            {({ email }) => <FinishResetForm token={token} email={email} onDone={() => setDone(true)} />}
          </QueryState>
        )}
        {isApiError(reset.error, 'token-invalid') && (
          <p className="pb-3">
            <Link to={paths.reset}>Ask for a new link</Link>
          </p>
        )}
      </Sheet>
    </>
  )
}
