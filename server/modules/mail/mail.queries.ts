import { randomUUID } from 'node:crypto'
import { and, eq, isNull, sql } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import { clubs, outbox } from '../../db/schema/identity.ts'

export async function insertMail(
  tx: Tx,
  mail: { clubId: string | null; to: string; template: string; payload: unknown },
): Promise<string> {
  // Its id is made here: who may write mail may not read it back.
  const id = randomUUID()
  const { clubId, to, template, payload } = mail
  await tx.insert(outbox).values({ id, clubId, toAddress: to, template, payload })
  return id
}

/** Counts a try of a mail that is still to be sent, and reads it; null where it was sent. */
export async function beginTry(tx: Tx, mailId: string) {
  const [mail] = await tx
    .update(outbox)
    .set({ attempts: sql`${outbox.attempts} + 1` })
    .where(and(eq(outbox.id, mailId), isNull(outbox.sentAt)))
    .returning()
  return mail ?? null
}

/** A mail that is done with keeps no payload. */
export async function markSent(tx: Tx, mailId: string, sentAt: Date): Promise<void> {
  await tx.update(outbox).set({ sentAt, payload: {}, lastError: null }).where(eq(outbox.id, mailId))
}

export async function markFailed(tx: Tx, mailId: string, lastError: string): Promise<void> {
  await tx.update(outbox).set({ lastError }).where(eq(outbox.id, mailId))
}

export async function findClubName(tx: Tx, clubId: string): Promise<string | null> {
  const [club] = await tx.select({ name: clubs.name }).from(clubs).where(eq(clubs.id, clubId))
  return club?.name ?? null
}
