import { useState } from 'react'

/** The refusal that a form shows at its head; null for none. */
export function useFormError(): [unknown, (error: unknown) => void] {
  const [error, setError] = useState<unknown>(null)
  return [error, setError]
}
