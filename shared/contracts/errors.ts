import { z } from 'zod'

/**
 * Every code that the API answers with. The sentence travels with the error; the client has wording of its own
 * for each code (src/lib/error-wording.ts), held complete by the type checker.
 */
export const errorCodes = [
  'invalid-request',
  'not-signed-in',
  'wrong-credentials',
  'not-allowed',
  'not-found',
  'stale-version',
  'idempotency-key-missing',
  'idempotency-key-reused',
  'still-running',
  'too-many-requests',
  'cross-site-request',
  'token-invalid',
  'email-taken',
  'name-taken',
  'last-admin',
  'already-invited',
  'athlete-already-linked',
  'file-too-large',
  'file-name-invalid',
  'chunk-invalid',
  'upload-incomplete',
  'upload-finished',
  'upload-dismissed',
  'too-many-uploads',
  'upload-in-use',
  'nothing-to-publish',
  'athlete-not-in-session',
  'event-misplaced',
  'engine-outdated',
  'recompute-running',
  'nothing-to-recompute',
  'payments-off',
  'payments-away',
  'payment-declined',
  'signature-invalid',
  'subscription-running',
  'subscription-missing',
  'club-reads-only',
  'athlete-unseated',
  'internal',
] as const

export const ErrorCode = z.enum(errorCodes)
export type ErrorCode = z.infer<typeof ErrorCode>

export const ErrorBody = z.strictObject({
  error: z.strictObject({
    code: ErrorCode,
    message: z.string(),
    /** Field → sentence for a refused form; the newer row for a stale version. */
    details: z.record(z.string(), z.unknown()).optional(),
  }),
})
export type ErrorBody = z.infer<typeof ErrorBody>
