import type { z } from 'zod'
import { isApiError } from '../api/api-error.ts'

/** The row as it stands now, which a refusal for a stale version carries; null for any other error. */
export function newerRow<S extends z.ZodType>(error: unknown, schema: S): z.output<S> | null {
  if (!isApiError(error, 'stale-version')) return null
  const parsed = schema.safeParse(error.details.newer)
  return parsed.success ? parsed.data : null
}
