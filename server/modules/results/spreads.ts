import type { Tx } from '../../db/database.ts'
import { spreadsOf } from './means.ts'
import { lockSpreads, replaceSpreads, type SpreadsPlace, valuesOfSessions } from './spreads.queries.ts'

/**
 * Rebuilds how much the sessions' trials vary within an athlete, after their results have changed. Taken last in
 * a transaction: whoever waits here sees the results of whoever went before.
 */
export async function rebuildSpreads(tx: Tx, place: SpreadsPlace): Promise<void> {
  await lockSpreads(tx, place)
  const bySheet = new Map<string, Awaited<ReturnType<typeof valuesOfSessions>>>()
  for (const result of await valuesOfSessions(tx, place)) {
    const sheet = `${result.sessionId}/${result.testKey}`
    bySheet.set(sheet, [...(bySheet.get(sheet) ?? []), result])
  }
  const rows = [...bySheet.values()].map((results) => ({
    sessionId: results[0].sessionId,
    testKey: results[0].testKey,
    spreads: spreadsOf(results),
  }))
  await replaceSpreads(tx, place, rows)
}
