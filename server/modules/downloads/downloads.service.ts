import { Readable } from 'node:stream'
import { ZipArchive } from 'archiver'
import type { SessionSheet } from '../../../shared/contracts/sessions.ts'
import type { Trial } from '../../../shared/contracts/trials.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { record } from '../audit/audit.service.ts'
import { sheet } from '../sessions/sheet.service.ts'
import { getSamples, getTrial } from '../trials/trials.service.ts'
import { openOriginal } from '../uploads/uploads.service.ts'
import { distinctPaths, safeName } from './entry-names.ts'
import { figuresCsv } from './figures-csv.ts'
import { samplesCsv } from './samples-csv.ts'

/** A name that says whose trial it is, where one is. */
function samplesName({ athlete, fileName, id }: Pick<Trial, 'athlete' | 'fileName' | 'id'>): string {
  const stem = (fileName ?? id).replace(/\.[^.]*$/u, '')
  return safeName(`${athlete ? `${athlete.name} - ` : ''}${stem}.csv`)
}

/** The trial's cleaned samples, as they are analysed. */
export async function trialCsv(deps: Deps, ctx: Caller, trialId: string) {
  const trial = await getTrial(deps, ctx, trialId)
  const samples = await getSamples(deps, ctx, trialId)
  return { fileName: samplesName(trial), lines: samplesCsv(trial.recording, samples) }
}

/** A stream whose bytes are fetched when the archive comes to it: no more of a session is in memory than one file. */
const whenItsTurnComes = (open: () => Promise<Iterable<string> | AsyncIterable<Buffer>>): Readable =>
  Readable.from(
    (async function* () {
      yield* await open()
    })(),
    { objectMode: false },
  )

/**
 * The session as a zip archive that is written as it is sent: `originals/`, `samples/` and `figures.csv`. Files of an
 * archive are in the archive; those that are kept elsewhere are there.
 */
export async function sessionArchive(deps: Deps, ctx: Caller, sessionId: string) {
  const { session, uploads, trials } = await sheet(deps, ctx, sessionId)
  await deps.db.inClub(ctx, (tx) => record(tx, ctx, 'session.download', 'session', sessionId))
  const archive = new ZipArchive({ zlib: { level: 6 } })
  const pathOf = distinctPaths()
  const add = (source: Readable, name: string): void => {
    // A fault while one file is fetched ends the whole: half an archive must not look whole.
    source.once('error', (error) => archive.destroy(error))
    archive.append(source, { name })
  }
  for (const upload of originalsOf(uploads)) {
    const open = async () => (await openOriginal(deps, ctx, upload.id)).chunks
    add(whenItsTurnComes(open), pathOf('originals/', upload.fileName))
  }
  const done: { trial: Trial; samplesPath: string }[] = []
  for (const { id } of trials) {
    const trial = await getTrial(deps, ctx, id)
    const samplesPath = pathOf('samples/', samplesName(trial))
    done.push({ trial, samplesPath })
    const open = async () => samplesCsv(trial.recording, await getSamples(deps, ctx, id))
    add(whenItsTurnComes(open), samplesPath)
  }
  archive.append(figuresCsv(done), { name: 'figures.csv' })
  // What goes wrong on the way is told by the stream.
  archive.finalize().catch(() => undefined)
  return { fileName: safeName(`${session.date} ${session.title}.zip`), archive }
}

const originalsOf = (uploads: SessionSheet['uploads']): SessionSheet['uploads'] =>
  uploads.filter(({ state, archive }) => archive === null && state !== 'receiving' && state !== 'duplicate')
