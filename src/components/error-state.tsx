import { isApiError, type AnyErrorCode } from '../api/api-error.ts'
import { wordingOf } from '../lib/error-wording.ts'
import { Button } from './button.tsx'

/** Asking again gives the same answer. */
const finalCodes: AnyErrorCode[] = ['not-found', 'not-allowed', 'token-invalid', 'invalid-request']

interface ErrorStateProps {
  error: unknown
  onRetry?: () => void
  retrying?: boolean
}

/** A part of a page that could not be fetched: what happened, what was seen, what to do. */
export function ErrorState({ error, onRetry, retrying = false }: ErrorStateProps) {
  const { title, advice } = wordingOf(error)
  const final = isApiError(error) && finalCodes.includes(error.code)
  return (
    <div role="alert" className="flex flex-col items-start gap-2 py-6">
      <p className="font-semibold">{title}</p>
      {isApiError(error) && <p className="max-w-prose">{error.message}</p>}
      <p className="max-w-prose text-ink-2">{advice}</p>
      {onRetry !== undefined && !final && (
        <Button onClick={onRetry} busy={retrying}>
          Try again
        </Button>
      )}
    </div>
  )
}
