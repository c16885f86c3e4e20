import { availableParallelism } from 'node:os'
import { fileURLToPath } from 'node:url'
import { Piscina } from 'piscina'
import type { Lot, Outcome } from './coverage-outcomes.ts'

/** Trials that a thread measures in one go. */
const LOT = 50

/** The first `count` trials, on all cores. */
export async function measureOnAllCores(of: Lot['of'], count: number): Promise<Outcome[]> {
  const pool = new Piscina({
    filename: fileURLToPath(new URL('./coverage-thread.ts', import.meta.url)),
    execArgv: ['--import', new URL('../../server/jobs/threads/load-typescript.mjs', import.meta.url).href],
    maxThreads: availableParallelism(),
  })
  const lots = Array.from({ length: Math.ceil(count / LOT) }, (_, i): Lot => {
    return { of, from: i * LOT, to: Math.min(count, (i + 1) * LOT) }
  })
  const outcomes = await Promise.all(lots.map((lot) => pool.run(lot) as Promise<Outcome[]>))
  await pool.close()
  return outcomes.flat()
}
