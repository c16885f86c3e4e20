import type { z } from 'zod'
import { invalidRequest } from './errors.ts'

/** The parsed value, or a 400 that says per field what is wrong. */
export function parse<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const parsed = schema.safeParse(value)
  if (parsed.success) return parsed.data
  const fields: Record<string, string> = {}
  for (const issue of parsed.error.issues) {
    const field = issue.path.join('.') || 'request'
    fields[field] ??= issue.message
  }
  throw invalidRequest('Some of what was sent could not be used.', fields)
}
