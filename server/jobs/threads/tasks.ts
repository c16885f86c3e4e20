import { deflate, inflate, inflateSync } from 'node:zlib'
import { promisify } from 'node:util'
import type { MessagePort } from 'node:worker_threads'
import { analyse } from '../../../shared/mechanics/analyse.ts'
import { usualTest } from '../../../shared/contracts/session-test.ts'
import type { Stretch } from '../../../shared/mechanics/events/unloaded.ts'
import { cutRecording } from '../../../shared/mechanics/trials/cut-recording.ts'
import type { AnalyseOptions, Recording, RecordingAnalysis, Test } from '../../../shared/mechanics/types.ts'
import { standardGravity } from '../../../shared/units/gravity.ts'
import { defaultSettings, type Settings } from '../../../shared/mechanics/settings.ts'
import type { ReadError } from '../../../shared/recordings/errors.ts'
import { previewOf } from '../../../shared/recordings/preview.ts'
import type { ReadSuccess } from '../../../shared/recordings/result.ts'
import { decodeSamples, encodeSamples } from '../../../shared/recordings/samples-codec.ts'
import { type ArchiveRead, readAnyFile } from '../../modules/uploads/archive/read-any-file.ts'

const deflated = promisify(deflate)
const inflated = promisify(inflate)

export interface ReadFile {
  bytes: Uint8Array
  fileName: string
  /** The test of its session: what tells the trials of a recording apart. */
  test: Test
  /** Told as reading begins: its time is counted from there. */
  began?: MessagePort
}

/** One trial's part of a recording. */
export interface TrialRead {
  /** On the recording's clock, s. */
  startS: number
  endS: number
  sampleCount: number
  filledSamples: number
  /** Total force, whole newtons. */
  preview: number[]
  /** In the stored form: shared/recordings/samples-codec.ts, then deflate. */
  samples: Uint8Array
}

/** A file that was read, in the form that goes into the database. */
export interface FileRead {
  ok: true
  format: ReadSuccess['format']
  columnMap: ReadSuccess['columnMap']
  notes: ReadSuccess['notes']
  sampleRateHz: number
  channels: string[]
  timeBaseError: number
  /** Of the samples of every trial. */
  encoding: 'planes-1-deflate'
  /** In the order of the recording; one that is all of it where the engine finds one trial or none. */
  trials: TrialRead[]
}

/** The parts of a recording that hold a trial each, in samples; all of it where the engine finds one or none. */
function partsOf(recording: Recording, test: Test): Stretch[] {
  const known = { test, gravity: standardGravity, calibrationU: {}, uncertainty: false }
  const { trials } = analyse(recording, known)
  const sampleAt = (timeS: number) => Math.round(timeS * recording.sampleRateHz)
  if (trials.length > 1)
    return trials.map(({ startS, endS }) => ({ from: sampleAt(startS), to: sampleAt(endS) + 1 }))
  return [{ from: 0, to: Object.values(recording.channels)[0]?.length ?? 0 }]
}

async function storedTrial(recording: Recording, part: Stretch): Promise<TrialRead> {
  const cut = cutRecording(recording, part)
  return {
    startS: part.from / recording.sampleRateHz,
    endS: (part.to - 1) / recording.sampleRateHz,
    sampleCount: part.to - part.from,
    filledSamples: cut.filledSamples,
    preview: previewOf(cut).forceN,
    samples: await deflated(encodeSamples(cut), { level: 6 }),
  }
}

/** Bytes of a file → samples in their stored form by trial, what an archive holds, or why it could not be read. */
export async function readFile({
  bytes,
  fileName,
  test,
  began,
}: ReadFile): Promise<FileRead | ArchiveRead | { ok: false; error: ReadError }> {
  began?.postMessage(null)
  const result = await readAnyFile(bytes, fileName)
  if (!result.ok || 'archive' in result) return result
  const { recording, format, columnMap, notes } = result
  return {
    ok: true,
    format,
    columnMap,
    notes,
    sampleRateHz: recording.sampleRateHz,
    // In the codec's order, which is also that of the bytes sent to a browser.
    channels: channelOrder.filter((channel) => recording.channels[channel]),
    timeBaseError: recording.timeBaseError,
    encoding: 'planes-1-deflate',
    trials: await Promise.all(partsOf(recording, test).map((part) => storedTrial(recording, part))),
  }
}

const channelOrder = ['left', 'right', 'single', 'total'] as const

export interface AnalyseSamples {
  /** In the stored form. */
  samples: Uint8Array
  options: AnalyseOptions
  settings: Settings
}

/** Stored samples → what the engine says of them. */
export async function analyseSamples({
  samples,
  options,
  settings,
}: AnalyseSamples): Promise<RecordingAnalysis> {
  return analyse(decodeSamples(await inflated(samples)), options, settings)
}

/**
 * Several at once, in one message each way. Nothing else runs in the thread meanwhile, so the blocking inflate is the
 * cheaper one.
 */
export function analyseAll(tasks: readonly AnalyseSamples[]): RecordingAnalysis[] {
  return tasks.map(({ samples, options, settings }) =>
    analyse(decodeSamples(inflateSync(samples)), options, settings),
  )
}

/** Runs the way of a recording once, so that the first real file does not pay for compiling it. */
export async function warmUp(): Promise<void> {
  const weights = [
    ...Array<number>(1500).fill(700),
    ...Array<number>(400).fill(0),
    ...Array<number>(1500).fill(700),
  ]
  const lines = weights.map((force, i) => `${i / 1000},${force + (i % 7)}`)
  const text = `Time (s),Force (N)\n${lines.join('\n')}\n`
  const bytes = new TextEncoder().encode(text)
  const read = await readFile({ bytes, fileName: 'warm-up.csv', test: usualTest('cmj') })
  if (read.ok && 'trials' in read)
    await analyseSamples({
      samples: read.trials[0].samples,
      options: { gravity: 9.80665, calibrationU: {} },
      settings: defaultSettings,
    })
}
