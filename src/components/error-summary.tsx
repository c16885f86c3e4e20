import type { FieldErrors, FieldValues } from 'react-hook-form'
import { Notice } from './notice.tsx'

interface ErrorSummaryProps<T extends FieldValues> {
  errors: FieldErrors<T>
  /** Field → its label, in the order of the form. */
  labels: { [K in keyof T]?: string }
}

function messageOf(error: unknown): string | null {
  if (typeof error !== 'object' || error === null) return null
  if ('message' in error && typeof error.message === 'string' && error.message !== '') return error.message
  return (
    Object.values(error)
      .map(messageOf)
      .find((message) => message !== null) ?? null
  )
}

/** Lists what is wrong with a form when it is more than one thing; the first field has the focus already. */
export function ErrorSummary<T extends FieldValues>({ errors, labels }: ErrorSummaryProps<T>) {
  const found = Object.entries(labels).flatMap(([field, label]) => {
    const message = messageOf(errors[field])
    return message === null ? [] : [{ field, label: String(label), message }]
  })
  if (found.length < 2) return null
  return (
    <Notice tone="stop" role="alert" title={`${found.length} fields need another look`}>
      <ul className="list-disc ps-5">
        {found.map(({ field, label, message }) => (
          <li key={field}>
            {label}: {message}
          </li>
        ))}
      </ul>
    </Notice>
  )
}
