import { drizzle } from 'drizzle-orm/node-postgres'
import { migrate } from 'drizzle-orm/node-postgres/migrator'
import pg from 'pg'
import { ConfigProblem, loadConfig } from '../config/config.ts'
import { createQueues } from '../jobs/create-queues.ts'

/** Any number, the same in every process: whoever migrates holds it, and the others wait. */
const migrationLock = 7_306_031

/**
 * Brings the database to the present schema and makes its queues, as its owner. Safe to run twice, and by two processes at once:
 * Drizzle's `migrate()` takes no lock, so the connection holds an advisory one.
 */
async function migrateDatabase(ownerUrl: string): Promise<void> {
  const client = new pg.Client({ connectionString: ownerUrl })
  await client.connect()
  try {
    await client.query('select pg_advisory_lock($1)', [migrationLock])
    await migrate(drizzle(client), { migrationsFolder: 'drizzle' })
    await createQueues(ownerUrl)
  } finally {
    await client.end()
  }
}

try {
  await migrateDatabase(loadConfig('owner').databaseUrl)
} catch (error) {
  console.error(error instanceof ConfigProblem ? error.message : error)
  process.exitCode = 1
}
