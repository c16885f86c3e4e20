import type { z } from 'zod'
import type { SessionForm } from '../../../shared/contracts/sessions.ts'

/** What is said of a session when it is made, and can be changed after. */
export type SessionValues = z.infer<typeof SessionForm>

/** A field that may be left empty. */
export const orNull = (typed: string | null) => typed?.trim() || null
