import { and, eq, gt, isNull } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import { passwordResets, people } from '../../db/schema/identity.ts'

const open = (tokenHash: Buffer, now: Date) =>
  and(
    eq(passwordResets.tokenHash, tokenHash),
    isNull(passwordResets.usedAt),
    gt(passwordResets.expiresAt, now),
  )

/** The person whose link this is, while it can still be used. */
export async function findOpenReset(tx: Tx, tokenHash: Buffer, now: Date) {
  const [reset] = await tx
    .select({ personId: passwordResets.personId, email: people.email })
    .from(passwordResets)
    .innerJoin(people, eq(people.id, passwordResets.personId))
    .where(open(tokenHash, now))
  return reset ?? null
}

/** Uses the link up; of two at once only one gets the person. */
export async function takeReset(tx: Tx, tokenHash: Buffer, now: Date): Promise<string | null> {
  const [taken] = await tx
    .update(passwordResets)
    .set({ usedAt: now })
    .where(open(tokenHash, now))
    .returning({ personId: passwordResets.personId })
  return taken?.personId ?? null
}

/** A newer password makes every older link worthless. */
export async function closeResets(tx: Tx, personId: string, now: Date): Promise<void> {
  await tx
    .update(passwordResets)
    .set({ usedAt: now })
    .where(and(eq(passwordResets.personId, personId), isNull(passwordResets.usedAt)))
}

export async function insertReset(
  tx: Tx,
  reset: { personId: string; tokenHash: Buffer; expiresAt: Date },
): Promise<void> {
  await tx.insert(passwordResets).values(reset)
}
