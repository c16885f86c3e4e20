import { loadConfig } from '../../server/config/config.ts'
import { createDatabase } from '../../server/db/database.ts'
import { ensureClient } from '../../server/setup/client-build.mjs'
import { startTestCluster } from '../../server/setup/test-cluster.mjs'
import { ApiClient } from '../api/harness/api-client.ts'
import { startTestingDay, type TestingDay } from '../api/harness/testing-day.ts'
import { startProduct, type Product } from '../setup/product.ts'

/** A day of tests in a running product, and who is tested. */
export interface BenchDay {
  product: Product
  day: TestingDay
  /** File name of the i-th jump: the athletes in turn, counted from 0. */
  fileName: (i: number) => string
}

/** Starts the real processes on a database of their own with a club of so many athletes, and stops all at the end. */
export async function onTestingDay(
  athletes: number,
  measure: (of: BenchDay) => Promise<void>,
): Promise<void> {
  await ensureClient()
  const { cluster, stop } = await startTestCluster()
  try {
    const product = await startProduct({ cluster })
    try {
      await onDay(product, athletes, measure)
    } catch (error) {
      console.error(product.output())
      throw error
    } finally {
      await product.stop()
    }
  } finally {
    await stop()
  }
}

async function onDay(
  product: Product,
  athletes: number,
  measure: (of: BenchDay) => Promise<void>,
): Promise<void> {
  const db = createDatabase(loadConfig('web', product.env), () => undefined)
  const names = Array.from({ length: athletes }, (_, i) => `Invented Person${String.fromCharCode(65 + i)}`)
  const signedIn = async ({ email }: { email: string }) => {
    const client = new ApiClient(product.url, [])
    await client.signIn(email)
    return client
  }
  try {
    const day = await startTestingDay({ db, signedIn }, names)
    const fileName = (i: number) => `${names[i % athletes]} cmj ${1 + Math.floor(i / athletes)}.csv`
    await measure({ product, day, fileName })
  } finally {
    await db.close()
  }
}
