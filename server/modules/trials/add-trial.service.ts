import type { Tx } from '../../db/database.ts'
import { sendJobs } from '../../jobs/queue.ts'
import type { FileRead } from '../../jobs/threads/tasks.ts'
import { candidatesOf } from '../sessions/sessions.service.ts'
import { matchAthlete } from './match-athlete.ts'
import { insertTrial } from './trials.queries.ts'

/** Makes the trial of a recording that was read, on the athlete whom its file name names or in the Tray. */
export async function addTrial(
  tx: Tx,
  clubId: string,
  upload: { id: string; sessionId: string; fileName: string; createdAt: Date },
  read: FileRead,
): Promise<void> {
  const { test, candidates } = await candidatesOf(tx, clubId, upload.sessionId)
  const athleteId = matchAthlete(upload.fileName, candidates)
  const trialId = await insertTrial(
    tx,
    {
      clubId,
      sessionId: upload.sessionId,
      uploadId: upload.id,
      athleteId,
      assignedBy: athleteId && 'file-name',
      ...test,
      startS: 0,
      endS: (read.sampleCount - 1) / read.sampleRateHz,
      preview: read.preview,
      droppedAt: upload.createdAt,
    },
    {
      sampleRateHz: read.sampleRateHz,
      sampleCount: read.sampleCount,
      channels: read.channels,
      filledSamples: read.filledSamples,
      timeBaseError: read.timeBaseError,
      encoding: read.encoding,
      bytes: Buffer.from(read.samples),
    },
  )
  await sendJobs(tx, 'analyse-trial', { version: 1, clubId, trialId })
}
