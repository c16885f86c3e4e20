import type { Tx } from '../../db/database.ts'
import { sendJobs } from '../../jobs/queue.ts'
import type { FileRead } from '../../jobs/threads/tasks.ts'
import { candidatesOf } from '../sessions/sessions.service.ts'
import { seatedAthletes } from '../seats/seats.service.ts'
import { matchAthlete } from './match-athlete.ts'
import { insertTrial } from './trials.queries.ts'

/**
 * Makes the trials of a recording that was read, on the athlete whom its file name names, or in the Tray: where it
 * names nobody, or somebody without a seat.
 */
export async function addTrials(
  tx: Tx,
  clubId: string,
  upload: { id: string; sessionId: string; fileName: string; createdAt: Date },
  read: FileRead,
): Promise<void> {
  const { test, candidates } = await candidatesOf(tx, clubId, upload.sessionId)
  const named = matchAthlete(upload.fileName, candidates)
  // Named among all of the session, so that nobody else is found in the place of one without a seat.
  const seated = await seatedAthletes(tx, clubId, upload.createdAt)
  const athleteId = named && seated.has(named) ? named : null
  const { sampleRateHz, channels, timeBaseError, encoding } = read
  for (const [i, { startS, endS, preview, samples, sampleCount, filledSamples }] of read.trials.entries()) {
    const trialId = await insertTrial(
      tx,
      {
        clubId,
        sessionId: upload.sessionId,
        uploadId: upload.id,
        ordinal: i + 1,
        athleteId,
        assignedBy: athleteId && 'file-name',
        ...test,
        startS,
        endS,
        preview,
        droppedAt: upload.createdAt,
      },
      {
        sampleRateHz,
        sampleCount,
        channels,
        filledSamples,
        timeBaseError,
        encoding,
        bytes: Buffer.from(samples),
      },
    )
    await sendJobs(tx, 'analyse-trial', { version: 1, clubId, trialId })
  }
}
