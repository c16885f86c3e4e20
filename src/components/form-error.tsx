import { isApiError } from '../api/api-error.ts'
import { wordingOf } from '../lib/error-wording.ts'
import { Notice } from './notice.tsx'

/** Why a form or an act was refused, at its head. Nothing while there is no error. */
export function FormError({ error }: { error: unknown }) {
  if (error === null || error === undefined) return null
  const { title, advice } = wordingOf(error)
  return (
    <Notice tone="stop" role="alert" title={title}>
      {isApiError(error) && error.message !== title && <p>{error.message}</p>}
      <p>{advice}</p>
    </Notice>
  )
}
