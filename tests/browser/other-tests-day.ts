import { perform } from '../../seed/synthetic/perform.ts'
import type { GivenAttempt } from '../../seed/synthetic/attempts.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import { writeDelimited } from '../../seed/synthetic/write-delimited.ts'
import { csv, type TestFile } from './club-day.ts'

/** What an athlete weighs and how they sway while being weighed. */
const athlete = {
  massKg: 68,
  body: { swayVelocity: 0.002, heartbeatN: 2, heartRateHz: 1.1, fidgetN: 0 },
}
const plates = {
  left: { whiteNoiseN: 1, offsetN: 2 },
  right: { whiteNoiseN: 1, offsetN: -1 },
}

/** A file of one recording in which the attempts follow each other, made from physics; each seed is another file. */
export function attemptsFile(name: string, seed: number, attempts: readonly GivenAttempt[]): TestFile {
  const performance = perform(athlete, attempts, seed)
  const recording = recordJump(performance, { durationS: performance.endS }, plates, seed)
  return csv(name, Buffer.from(writeDelimited(recording)))
}
