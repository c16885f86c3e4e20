import PgBoss from 'pg-boss'
import { expireInSeconds, type QueueDefinition, queueNames, queues, queueSchema } from './queues.ts'

/**
 * Makes or updates pg-boss's schema and every queue of the list, as the owner of the database: it is DDL, which
 * neither web nor worker may do. Safe to run twice. Dead-letter queues stand first in the list, since a queue
 * refers to its own.
 */
export async function createQueues(ownerUrl: string): Promise<void> {
  const boss = new PgBoss({
    connectionString: ownerUrl,
    schema: queueSchema,
    max: 1,
    supervise: false,
    schedule: false,
  })
  // Without a listener a lost connection would end the process; the failing statement says the same.
  boss.on('error', () => undefined)
  await boss.start()
  try {
    for (const name of queueNames) {
      const { retryLimit, retryDelaySeconds, after }: QueueDefinition = queues[name]
      const options = {
        name,
        retryLimit,
        retryDelay: retryDelaySeconds,
        retryBackoff: true,
        expireInSeconds,
        ...(after ? { deadLetter: after } : {}),
      }
      await boss.createQueue(name, options)
      await boss.updateQueue(name, options)
    }
    await boss.getDb().executeSql(grants, [])
  } finally {
    await boss.stop({ graceful: false })
  }
}

/** Web sends; the worker takes, completes, expires and archives. */
const grants = `
  grant usage on schema ${queueSchema} to underfoot_web, underfoot_worker;
  grant select on ${queueSchema}.version, ${queueSchema}.queue to underfoot_web, underfoot_worker;
  grant update on ${queueSchema}.version to underfoot_worker;
  grant select, insert on ${queueSchema}.job to underfoot_web;
  grant select, insert, update, delete on ${queueSchema}.job, ${queueSchema}.archive to underfoot_worker;
`
