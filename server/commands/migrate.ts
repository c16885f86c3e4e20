import { drizzle } from 'drizzle-orm/node-postgres'
import { migrate } from 'drizzle-orm/node-postgres/migrator'
import pg from 'pg'

/** Any number, the same in every process: whoever migrates holds it, and the others wait. */
const migrationLock = 7_306_031

/**
 * Brings the database to the present schema, as its owner. Safe to run twice, and by two processes at once:
 * Drizzle's `migrate()` takes no lock, so the connection holds an advisory one.
 */
async function migrateDatabase(ownerUrl: string): Promise<void> {
  const client = new pg.Client({ connectionString: ownerUrl })
  await client.connect()
  try {
    await client.query('select pg_advisory_lock($1)', [migrationLock])
    await migrate(drizzle(client), { migrationsFolder: 'drizzle' })
  } finally {
    await client.end()
  }
}

const ownerUrl = process.env.DATABASE_OWNER_URL
if (!ownerUrl) throw new Error('DATABASE_OWNER_URL is not set: the address of the database, as its owner.')
await migrateDatabase(ownerUrl)
