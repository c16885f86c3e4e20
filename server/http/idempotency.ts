import { createHash } from 'node:crypto'
import type { Request } from 'express'
import type { Endpoint } from '../../shared/contracts/endpoint.ts'
import type { Deps } from '../deps.ts'
import type { Caller } from './caller.ts'
import { namedError } from './errors.ts'
import { claimKey, completeKey, releaseKey, type KeyClaim } from './idempotency.queries.ts'

interface KeyedCall {
  deps: Deps
  ctx: Caller
  req: Request
  params: unknown
  body: unknown
}

/**
 * Runs a mutation once for its `Idempotency-Key`: the same request again gets the first answer again. A request
 * that failed leaves no trace, so it can be sent again with the same key. One that was cut off keeps the key:
 * whether it was done is not known, so it is never done twice.
 */
export async function answerOnce(
  endpoint: Endpoint,
  call: KeyedCall,
  run: () => Promise<unknown>,
): Promise<unknown> {
  const { deps, ctx } = call
  const claim: KeyClaim = {
    key: readKey(call.req),
    route: `${endpoint.method} ${endpoint.path}`,
    requestHash: createHash('sha256')
      .update(JSON.stringify([call.params, call.body]))
      .digest(),
  }
  const earlier = await deps.db.inClub(ctx, (tx) => claimKey(tx, ctx, claim))
  if (earlier) return earlierAnswer(claim, earlier)
  let response: unknown
  try {
    response = await run()
  } catch (error) {
    // Where even this fails the key stays taken, which is safe; the first error is the one to tell.
    await deps.db.inClub(ctx, (tx) => releaseKey(tx, ctx, claim.key)).catch(() => undefined)
    throw error
  }
  await deps.db.inClub(ctx, (tx) => completeKey(tx, ctx, claim.key, response))
  return response
}

function readKey(req: Request): string {
  const key = req.get('Idempotency-Key') ?? ''
  if (/^[\w-]{16,100}$/.test(key)) return key
  throw namedError(
    'idempotency-key-missing',
    400,
    'A change needs an Idempotency-Key header of 16 to 100 letters, digits, - or _, new for each change.',
  )
}

function earlierAnswer(
  claim: KeyClaim,
  earlier: { route: string; requestHash: Buffer; status: number | null; response: unknown },
): unknown {
  if (earlier.route !== claim.route || !earlier.requestHash.equals(claim.requestHash)) {
    throw namedError('idempotency-key-reused', 422, 'This Idempotency-Key was used for another change.')
  }
  if (earlier.status === null) {
    throw namedError(
      'still-running',
      409,
      'The same change was sent before and has not ended. Reload to see whether it was saved.',
    )
  }
  return earlier.response
}
