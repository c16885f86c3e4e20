import type { FieldValues, Path, UseFormReturn } from 'react-hook-form'
import { isApiError, type AnyErrorCode } from '../api/api-error.ts'
import { wordingOf } from './error-wording.ts'

interface Blame<T extends FieldValues> {
  /** Codes that are about one field. */
  fieldOf?: Partial<Record<AnyErrorCode, Path<T>>>
}

/**
 * Puts a refusal at the fields that it names, and focuses the first of them. Hands back the error if it is about no
 * field of this form, to be shown at the form's head.
 */
export function placeFieldErrors<T extends FieldValues>(
  form: UseFormReturn<T>,
  error: unknown,
  { fieldOf = {} }: Blame<T> = {},
): unknown {
  if (!isApiError(error)) return error
  const field = fieldOf[error.code]
  if (field !== undefined) {
    const { title, advice } = wordingOf(error)
    form.setError(field, { type: 'server', message: `${title}. ${advice}` }, { shouldFocus: true })
    return null
  }
  if (error.code !== 'invalid-request') return error
  const known = Object.keys(form.getValues())
  const named = Object.entries(error.details).filter(([path]) => known.includes(path.split('.')[0] ?? ''))
  named.forEach(([path, sentence], index) => {
    form.setError(
      path as Path<T>,
      { type: 'server', message: String(sentence) },
      { shouldFocus: index === 0 },
    )
  })
  return named.length === 0 ? error : null
}
