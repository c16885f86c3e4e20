import { type SQL, sql } from 'drizzle-orm'
import PgBoss from 'pg-boss'
import type { Tx } from '../db/database.ts'
import { type PayloadOf, type QueueName, queueSchema } from './queues.ts'

/** The sending side of pg-boss: it has no connection of its own and is never started. */
const boss = new PgBoss({
  db: { executeSql: () => Promise.reject(new Error('A job is sent inside a transaction.')) },
  schema: queueSchema,
  supervise: false,
  schedule: false,
  migrate: false,
})

/** Sends jobs inside the business transaction: they are there exactly when what they work on is. */
export async function sendJobs<N extends QueueName>(
  tx: Tx,
  queue: N,
  ...payloads: PayloadOf<N>[]
): Promise<void> {
  if (payloads.length === 0) return
  await boss.insert(
    payloads.map((data) => ({ name: queue, data })),
    { db: { executeSql: (text, values) => tx.execute(asDrizzle(text, values)) } },
  )
}

/** A statement with `$1`, `$2` … and its values as a Drizzle statement, so that it joins the transaction. */
function asDrizzle(text: string, values: unknown[]): SQL {
  // The pieces alternate: text, number of a value, text, number of a value …
  const pieces = text.split(/\$(\d+)/u)
  return sql.join(
    pieces.map((piece, i) => (i % 2 === 0 ? sql.raw(piece) : sql.param(values[Number(piece) - 1]))),
  )
}
