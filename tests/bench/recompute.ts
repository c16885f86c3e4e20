import { getRecompute, getStanding, startRecompute } from '../../shared/contracts/recomputes.ts'
import { pause } from '../../server/setup/pause.mjs'
import { dropFile, settledSheet, type TestingDay } from '../api/harness/testing-day.ts'
import { eightSeconds } from './eight-seconds.ts'
import { fillTrials } from './fill-trials.ts'
import { onTestingDay } from './on-testing-day.ts'

const originals = 24
const trials = 10_000
const lookEveryMs = 250
const giveUpMs = 600_000

/**
 * Recomputes 10,000 stored trials (8 s at 1000 Hz on two plates) with two workers, through the real web process and
 * PostgreSQL: a dry run, then the recompute itself. Prints the rate of both.
 */
export async function benchRecompute(): Promise<void> {
  await onTestingDay(originals / 2, async ({ product, day, fileName }) => {
    product.startWorker()
    for (let i = 0; i < originals; i++)
      await dropFile(day.coach, day.session.id, fileName(i), eightSeconds(i + 1))
    await settledSheet(day.coach, day.session.id)
    await fillTrials(product.database, day.clubId, trials)
    for (const dryRun of [true, false]) report(dryRun, await timeRun(day, dryRun))
    const { stale } = await day.coach.call(getStanding)
    if (stale > 0) throw new Error(`${stale} analyses are still of the engine before.`)
  })
}

async function timeRun({ coach }: TestingDay, dryRun: boolean): Promise<number> {
  const began = performance.now()
  const { id, total } = await coach.call(startRecompute, { body: { scope: { kind: 'club' }, dryRun } })
  if (total !== trials) throw new Error(`${total} trials are to be recomputed, not ${trials}.`)
  for (;;) {
    const { recompute } = await coach.call(getRecompute, { params: { recomputeId: id } })
    if (recompute.state === 'done') return (performance.now() - began) / 1000
    if (!['waiting', 'running'].includes(recompute.state) || performance.now() - began > giveUpMs)
      throw new Error(`The recompute is ${recompute.state} with ${recompute.done} of ${recompute.total}.`)
    await pause(lookEveryMs)
  }
}

function report(dryRun: boolean, seconds: number): void {
  const what = dryRun ? 'dry run' : 'recompute'
  const rate = (trials / seconds).toFixed(0)
  console.log(`${what} of ${trials} stored trials, two workers: ${seconds.toFixed(1)} s, ${rate} trials/s`)
}
