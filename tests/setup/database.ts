import { randomBytes } from 'node:crypto'
import { inject } from 'vitest'
import { databaseUrl, onDatabase } from '../../server/setup/database-urls.mjs'
import { forEachRole, makeDatabase } from '../../server/setup/roles.mjs'
import { templateDatabase, type TestCluster } from '../../server/setup/test-cluster.mjs'

/** A migrated database without a row, for one test file: the three addresses the product knows, and its end. */
export interface TestDatabase {
  ownerUrl: string
  webUrl: string
  workerUrl: string
  /** The superuser's address, for what only a test may look at (row-level security does not hold for it). */
  adminUrl: string
  drop: () => Promise<void>
}

/**
 * Clones the migrated template. Call it in `beforeAll`, and `drop` in `afterAll`.
 * @param cluster where it is not Vitest that runs
 */
export async function createTestDatabase(cluster?: TestCluster): Promise<TestDatabase> {
  const { port, adminUrl, passwords } = cluster ?? inject('testCluster')
  const name = `test_${randomBytes(6).toString('hex')}`
  await makeDatabase(adminUrl, name, templateDatabase)
  const urls = forEachRole((role, key) => databaseUrl(role, passwords[key], port, name))
  return {
    ownerUrl: urls.owner,
    webUrl: urls.web,
    workerUrl: urls.worker,
    adminUrl: adminUrl.replace(/[^/]*$/, name),
    drop: () =>
      onDatabase(adminUrl, async (admin) => void (await admin.query(`drop database ${name} with (force)`))),
  }
}
