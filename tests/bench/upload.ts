import { getSession } from '../../shared/contracts/sessions.ts'
import { pause } from '../../server/setup/pause.mjs'
import { dropFile, type TestingDay } from '../api/harness/testing-day.ts'
import { eightSeconds } from './eight-seconds.ts'
import { onTestingDay } from './on-testing-day.ts'

const files = 40
/** As many at once as the drop zone sends. */
const atOnce = 4
/** s, from the first byte sent to the last figure on the sheet. */
const mostS = 8
const giveUpMs = 60_000
/** As often as an open sheet reads again while files come in. */
const lookEveryMs = 250

/**
 * Drops files on a session through the real web process, worker and PostgreSQL, as a browser does, and prints the
 * time until the sheet shows every one of them analysed.
 */
export async function benchUpload(): Promise<void> {
  await onTestingDay(files / 2, async ({ day, fileName }) => {
    const drop = Array.from({ length: files }, (_, i) => ({ name: fileName(i), bytes: eightSeconds(i + 1) }))
    report(
      await timeDrop(day, drop),
      drop.reduce((sum, { bytes }) => sum + bytes.length, 0),
    )
  })
}

async function timeDrop(day: TestingDay, drop: { name: string; bytes: Uint8Array }[]): Promise<number> {
  const waiting = [...drop]
  const began = performance.now()
  const send = async () => {
    for (let file = waiting.shift(); file; file = waiting.shift()) {
      await dropFile(day.coach, day.session.id, file.name, file.bytes)
    }
  }
  await Promise.all(Array.from({ length: atOnce }, send))
  while ((await countAnalysed(day)) < files) {
    if (performance.now() - began > giveUpMs) throw new Error('The trials were not analysed in time.')
    await pause(lookEveryMs)
  }
  return (performance.now() - began) / 1000
}

async function countAnalysed({ coach, session }: TestingDay): Promise<number> {
  const { trials } = await coach.call(getSession, { params: { sessionId: session.id } })
  return trials.filter(({ analysis }) => analysis !== null).length
}

function report(seconds: number, bytes: number): void {
  const ratio = seconds / mostS
  console.log(
    `${files} files dropped → ${files} analysed: ${seconds.toFixed(2)} s (${(bytes / 1e6).toFixed(1)} MB)`,
  )
  console.log(`limit ${mostS} s, ratio ${ratio.toFixed(2)}: ${ratio < 1 ? 'kept' : 'MISSED'}`)
}
