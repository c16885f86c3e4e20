import { useState } from 'react'
import { Link } from 'react-router-dom'
import { limits } from '../../shared/contracts/limits.ts'
import { PageHead } from '../components/page-head.tsx'
import { Sheet } from '../components/sheet.tsx'
import { RequestResetForm } from '../features/account/request-reset-form.tsx'
import { paths } from '../lib/paths.ts'

export function ResetPage() {
  const [sentTo, setSentTo] = useState<string | null>(null)
  return (
    <>
      <PageHead title="Set a new password" />
      <Sheet>
        <div className="flex flex-col gap-4 py-1">
          {sentTo === null ? (
            <>
              <p>We send a link to your address; with it you choose a new password.</p>
              <RequestResetForm onSent={setSentTo} />
            </>
          ) : (
            <p role="status">
              If {sentTo} has an account, a link is on its way. It works once, for {limits.resetMinutes}{' '}
              minutes. If nothing comes, look among the unwanted mail, or ask your club’s admin which address
              they have.
            </p>
          )}
          <p className="text-small">
            <Link to={paths.signIn}>Back to sign-in</Link>
          </p>
        </div>
      </Sheet>
    </>
  )
}
