import { deflate, inflate, inflateSync } from 'node:zlib'
import { promisify } from 'node:util'
import { analyse } from '../../../shared/mechanics/analyse.ts'
import type { AnalyseOptions, RecordingAnalysis } from '../../../shared/mechanics/types.ts'
import { defaultSettings, type Settings } from '../../../shared/mechanics/settings.ts'
import type { ReadError } from '../../../shared/recordings/errors.ts'
import { previewOf } from '../../../shared/recordings/preview.ts'
import { readRecording } from '../../../shared/recordings/read-recording.ts'
import type { ReadSuccess } from '../../../shared/recordings/result.ts'
import { decodeSamples, encodeSamples } from '../../../shared/recordings/samples-codec.ts'

const deflated = promisify(deflate)
const inflated = promisify(inflate)

export interface ReadFile {
  bytes: Uint8Array
  fileName: string
}

/** A file that was read, in the form that goes into the database. */
export interface FileRead {
  ok: true
  format: ReadSuccess['format']
  columnMap: ReadSuccess['columnMap']
  notes: ReadSuccess['notes']
  sampleRateHz: number
  sampleCount: number
  channels: string[]
  filledSamples: number
  timeBaseError: number
  /** Total force, whole newtons. */
  preview: number[]
  /** Of `samples`: shared/recordings/samples-codec.ts, then deflate. */
  encoding: 'planes-1-deflate'
  samples: Uint8Array
}

/** Bytes of a file → samples in their stored form, or why it could not be read. */
export async function readFile({
  bytes,
  fileName,
}: ReadFile): Promise<FileRead | { ok: false; error: ReadError }> {
  const result = readRecording(bytes, fileName)
  if (!result.ok) return result
  const { recording, format, columnMap, notes } = result
  const channels = Object.entries(recording.channels)
  return {
    ok: true,
    format,
    columnMap,
    notes,
    sampleRateHz: recording.sampleRateHz,
    sampleCount: channels[0]?.[1].length ?? 0,
    // In the codec's order, which is also that of the bytes sent to a browser.
    channels: channelOrder.filter((channel) => recording.channels[channel]),
    filledSamples: recording.filledSamples,
    timeBaseError: recording.timeBaseError,
    preview: previewOf(recording).forceN,
    encoding: 'planes-1-deflate',
    samples: await deflated(encodeSamples(recording), { level: 6 }),
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
  const read = await readFile({ bytes: new TextEncoder().encode(text), fileName: 'warm-up.csv' })
  if (read.ok)
    await analyseSamples({
      samples: read.samples,
      options: { gravity: 9.80665, calibrationU: {} },
      settings: defaultSettings,
    })
}
