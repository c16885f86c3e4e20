import type { TestProject } from 'vitest/node'
import { startTestCluster, type TestCluster } from '../../server/setup/test-cluster.mjs'

declare module 'vitest' {
  export interface ProvidedContext {
    testCluster: TestCluster
  }
}

/**
 * Before the first test file of a project that needs PostgreSQL: the server that `npm test` started and
 * shares, or one of this run's own.
 */
export default async function provideCluster(project: TestProject): Promise<() => Promise<void>> {
  const shared = process.env.UNDERFOOT_TEST_CLUSTER
  if (shared) {
    project.provide('testCluster', JSON.parse(shared) as TestCluster)
    return () => Promise.resolve()
  }
  const { cluster, stop } = await startTestCluster()
  project.provide('testCluster', cluster)
  return stop
}
