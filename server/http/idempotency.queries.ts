import { and, eq, lt, sql } from 'drizzle-orm'
import type { Tx } from '../db/database.ts'
import { idempotencyKeys } from '../db/schema/records.ts'
import type { Caller } from './caller.ts'

export interface KeyClaim {
  key: string
  route: string
  requestHash: Buffer
}

const ofPerson = ({ clubId, personId }: Caller) =>
  and(eq(idempotencyKeys.clubId, clubId), eq(idempotencyKeys.personId, personId))
const ofKey = (ctx: Caller, key: string) => and(ofPerson(ctx), eq(idempotencyKeys.key, key))

/** Takes the key for this request; where it is taken already, the row that has it. Keys live for two days. */
export async function claimKey(tx: Tx, ctx: Caller, claim: KeyClaim) {
  await tx
    .delete(idempotencyKeys)
    .where(and(ofPerson(ctx), lt(idempotencyKeys.createdAt, sql`now() - interval '2 days'`)))
  const taken = await tx
    .insert(idempotencyKeys)
    .values({ clubId: ctx.clubId, personId: ctx.personId, ...claim })
    .onConflictDoNothing()
    .returning({ key: idempotencyKeys.key })
  if (taken.length > 0) return null
  const [earlier] = await tx.select().from(idempotencyKeys).where(ofKey(ctx, claim.key))
  // Released in between: the other request failed this very moment, and says so to its own sender.
  return earlier ?? { ...claim, status: null, response: null }
}

export async function completeKey(tx: Tx, ctx: Caller, key: string, response: unknown): Promise<void> {
  await tx.update(idempotencyKeys).set({ status: 200, response }).where(ofKey(ctx, key))
}

export async function releaseKey(tx: Tx, ctx: Caller, key: string): Promise<void> {
  await tx.delete(idempotencyKeys).where(ofKey(ctx, key))
}
