import { createHash } from 'node:crypto'
import type { Pool } from 'pg'
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible'
import { namedError } from './errors.ts'

const minute = 60

/** Tries allowed in a time, in seconds. Common practice: few for one address, more for one network of many people. */
const rateRules = {
  'sign-in-address': { points: 10, duration: 15 * minute },
  'sign-in-network': { points: 100, duration: 15 * minute },
  'password-person': { points: 10, duration: 15 * minute },
  'reset-address': { points: 5, duration: 60 * minute },
  'reset-network': { points: 60, duration: 60 * minute },
  'invitation-address': { points: 5, duration: 60 * minute },
  'link-network': { points: 60, duration: 15 * minute },
} as const
export type RateRule = keyof typeof rateRules

/** Counts one try against a rule; throws a 429 that says when to come back. `who` is stored hashed. */
export async function countTry(pool: Pool, rule: RateRule, who: string): Promise<void> {
  try {
    await limiter(pool, rule).consume(keyOf(who))
  } catch (refusal) {
    if (refusal instanceof RateLimiterRes) throw tooManyRequests(refusal.msBeforeNext)
    throw refusal
  }
}

/** Takes back all tries of one address, or one try of a shared network: the person was who they said. */
export async function forgetTries(pool: Pool, rule: RateRule, who: string): Promise<void> {
  await limiter(pool, rule).delete(keyOf(who))
}
export async function takeBackTry(pool: Pool, rule: RateRule, who: string): Promise<void> {
  await limiter(pool, rule).reward(keyOf(who))
}

/** Keeps the table small: removes what has expired, now and then, for as long as the process lives. */
export function removeExpiredTries(pool: Pool): void {
  new RateLimiterPostgres({ ...table(pool), points: 1, duration: 1, clearExpiredByTimeout: true })
}

const limiter = (pool: Pool, rule: RateRule) =>
  new RateLimiterPostgres({
    ...table(pool),
    ...rateRules[rule],
    keyPrefix: rule,
    clearExpiredByTimeout: false,
  })

const table = (pool: Pool) => ({
  storeClient: pool,
  storeType: 'pool',
  schemaName: 'identity',
  tableName: 'rate_limits',
  tableCreated: true,
})

const keyOf = (who: string) => createHash('sha256').update(who).digest('base64url')

function tooManyRequests(waitMs: number) {
  const minutes = Math.max(1, Math.ceil(waitMs / 60_000))
  const message = `Too many tries. Wait ${minutes} ${minutes === 1 ? 'minute' : 'minutes'}, then try again.`
  return namedError('too-many-requests', 429, message, { retryAfterS: Math.ceil(waitMs / 1000) })
}
