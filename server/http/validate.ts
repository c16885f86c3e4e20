import type { z } from 'zod'
import { invalidRequest } from './errors.ts'

const unusable = 'Some of what was sent could not be used.'

/** The parsed value, or a 400 that says per field what is wrong. */
export function parse<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const parsed = schema.safeParse(value)
  if (parsed.success) {
    refuseUnstorable(parsed.data)
    return parsed.data
  }
  const fields: Record<string, string> = {}
  for (const issue of parsed.error.issues) {
    const field = issue.path.join('.') || 'request'
    fields[field] ??= issue.message
  }
  throw invalidRequest(unusable, fields)
}

/** PostgreSQL keeps neither U+0000 nor half a surrogate pair in a text. */
function refuseUnstorable(value: unknown, path: readonly string[] = []): void {
  if (typeof value === 'string' && /\0|\p{Cs}/u.test(value)) {
    const field = path.join('.') || 'request'
    throw invalidRequest(unusable, { [field]: 'Holds a character that is no text; type it anew' })
  }
  if (typeof value !== 'object' || value === null || ArrayBuffer.isView(value)) return
  for (const [key, inner] of Object.entries(value)) refuseUnstorable(inner, [...path, key])
}
