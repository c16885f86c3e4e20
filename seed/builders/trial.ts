import { randomBytes, randomUUID } from 'node:crypto'
import { deflateSync } from 'node:zlib'
import { encodeSamples } from '../../shared/recordings/samples-codec.ts'
import { workerContext, type Database } from '../../server/db/database.ts'
import { publications } from '../../server/db/schema/sessions.ts'
import { analyses, publishedTrials, trials, trialSamples } from '../../server/db/schema/trials.ts'
import { fileChunks, files, uploads } from '../../server/db/schema/uploads.ts'

/** An upload of one small finished file; returns its id. Needs a database of the web role. */
export async function buildUpload(
  db: Database,
  clubId: string,
  row: { sessionId: string; uploadedBy: string; fileName?: string; state?: string },
): Promise<string> {
  const [id, fileId, bytes] = [randomUUID(), randomUUID(), randomBytes(24)]
  await db.inClub(workerContext(clubId), async (tx) => {
    const file = { clubId, id: fileId, sizeBytes: bytes.length, sha256: randomBytes(32) }
    await tx.insert(files).values({ ...file, finishedAt: new Date() })
    await tx.insert(fileChunks).values({ clubId, fileId, n: 0, bytes })
    await tx.insert(uploads).values({ clubId, id, fileId, fileName: 'recording.csv', state: 'read', ...row })
  })
  return id
}

/** A trial of an upload, in the Tray unless an athlete is given; returns its id. */
export async function buildTrial(
  db: Database,
  clubId: string,
  row: { sessionId: string; uploadId: string; athleteId?: string | null },
): Promise<string> {
  const id = randomUUID()
  const assignedBy = row.athleteId ? 'hand' : null
  await db.inClub(workerContext(clubId), (tx) =>
    tx
      .insert(trials)
      .values({ clubId, id, protocol: 'cmj', startS: 0, endS: 3, preview: [800, 820], assignedBy, ...row }),
  )
  return id
}

/** Three seconds of somebody of 80 kg standing still, at 1000 Hz on one plate. */
function standingSamples() {
  const facts = { sampleRateHz: 1000, filledSamples: 0, timeBaseError: 0 }
  const recording = { ...facts, channels: { total: new Float64Array(3000).fill(784.8) }, notes: [] }
  const bytes = deflateSync(encodeSamples(recording))
  return { ...facts, sampleCount: 3000, channels: ['total'], encoding: 'planes-1-deflate', bytes }
}

/** Samples and an analysis of a trial with one figure; returns the analysis' id. Needs the worker's role. */
export async function buildAnalysis(
  workerDb: Database,
  clubId: string,
  { trialId, jumpHeightM = 0.3 }: { trialId: string; jumpHeightM?: number },
): Promise<string> {
  const id = randomUUID()
  await workerDb.inClub(workerContext(clubId), async (tx) => {
    await tx.insert(trialSamples).values({ clubId, trialId, ...standingSamples() })
    await tx.insert(analyses).values({
      clubId,
      id,
      trialId,
      engineVersion: 'built',
      inputsHash: randomBytes(32),
      inputs: {
        test: { protocol: 'cmj', side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips' },
        recordedMassKg: null,
        gravity: 9.81,
        calibrationU: {},
        settings: 'built',
      },
      events: {},
      metricValues: { jumpHeightImpulse: jumpHeightM },
      metricUncertainties: { jumpHeightImpulse: [0.004, 2, null, 2] },
      checks: [],
      missing: [],
      notes: [],
    })
  })
  return id
}

/** Pins a trial's analysis as published to its athlete. Needs a database of the web role. */
export async function buildPublication(
  db: Database,
  clubId: string,
  pin: { sessionId: string; publishedBy: string; trialId: string; analysisId: string; athleteId: string },
): Promise<void> {
  const { sessionId, publishedBy, ...trial } = pin
  const id = randomUUID()
  await db.inClub(workerContext(clubId), async (tx) => {
    await tx.insert(publications).values({ clubId, id, sessionId, publishedBy })
    await tx.insert(publishedTrials).values({ clubId, publicationId: id, ...trial })
  })
}
