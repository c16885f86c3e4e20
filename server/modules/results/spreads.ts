import type { Tx } from '../../db/database.ts'
import { spreadsOf } from './means.ts'
import { lockSpreads, replaceSpreads, type SpreadsPlace, valuesOfSession } from './spreads.queries.ts'

/**
 * Rebuilds how much the session's trials vary within an athlete, after its results have changed. Taken last in
 * a transaction: whoever waits here sees the results of whoever went before.
 */
export async function rebuildSpreads(tx: Tx, place: SpreadsPlace): Promise<void> {
  await lockSpreads(tx, place)
  const results = await valuesOfSession(tx, place)
  const tests = [...new Set(results.map(({ testKey }) => testKey))]
  const rows = tests.map((testKey) => ({
    testKey,
    spreads: spreadsOf(results.filter((result) => result.testKey === testKey)),
  }))
  await replaceSpreads(tx, place, rows)
}
