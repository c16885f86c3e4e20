import { describe, expect, it } from 'vitest'
import type { z } from 'zod'
import { endpoints } from './all-endpoints.ts'

/** Whether what no schema names is refused, in an object. */
const refusesUnknownKeys = (schema: z.ZodType) =>
  schema
    .safeParse({ 'no-such-key': 1 })
    .error?.issues.some(({ code, path }) => code === 'unrecognized_keys' && path.length === 0) ?? false

/** Forms of files, which the multipart reader bounds, and bodies that must be empty. */
const takesNoJson = (schema: z.ZodType) => ['unknown', 'null'].includes(schema.type)

describe.each(Object.entries(endpoints))('the endpoint %s', (_name, { params, query, body }) => {
  it('refuses unknown keys in its path, its query and its body', () => {
    expect(refusesUnknownKeys(params)).toBe(true)
    expect(refusesUnknownKeys(query)).toBe(true)
    if (!takesNoJson(body)) expect(refusesUnknownKeys(body)).toBe(true)
  })
})
