import { fileStyles } from '../../../seed/synthetic/file-styles.ts'
import { makeJump } from '../../../seed/synthetic/jump.ts'
import { seededRandom } from '../../../seed/synthetic/random.ts'
import { recordJump } from '../../../seed/synthetic/record.ts'
import { writeDelimited } from '../../../seed/synthetic/write-delimited.ts'
import { readErrorCodes } from '../../../shared/recordings/errors.ts'
import { readRecording } from '../../../shared/recordings/read-recording.ts'
import type { ReadSuccess } from '../../../shared/recordings/result.ts'
import { madeCases } from '../../cases/make/all.ts'
import { mutated } from './mutate.ts'
import { readSlowly } from './slow-reader.ts'

/** What came of a number of damaged files. */
export interface MutationReport {
  files: number
  accepted: number
  /** Accepted, and equal to the slow reader's numbers in every sample. */
  equal: number
  /** Accepted with a note that says what was corrected, filled or left out. */
  noted: number
  /** Waiting for a person's map. */
  needsMap: number
  slowestMs: number
  /** What must not be: the seed of each file and what was wrong with its reading. */
  faults: string[]
}

/** Notes by which samples may differ from what stands in the file. */
const CORRECTIONS = new Set([
  ...[
    'samples-filled',
    'ends-trimmed',
    'last-line-cut',
    'lines-left-out',
    'sentinels-left-out',
    'stamps-filled',
  ],
  ...['from-body-weights', 'decimal-comma-assumed'],
])

const LONGEST_MS = 5000

/** Whole files of every style, on which the damage is done. */
export function wholeFiles(): Uint8Array[] {
  const recording = recordJump(makeJump({ stanceS: 0.3 }), { durationS: 0.8, sampleRateHz: 250 })
  const styled = Object.values(fileStyles).map((style) => writeDelimited(recording, style))
  const corpus = madeCases
    .filter(({ expected }) => expected.reading && !expected.hints)
    .map(({ bytes }) => bytes)
  return [...styled, ...styled, ...styled, ...corpus]
}

/** The first way in which an accepted reading differs from the slow reader's without a note; null for none. */
function difference(bytes: Uint8Array, result: ReadSuccess): string | null {
  const { recording, format, columnMap } = result
  if (format.kind !== 'delimited') return `was read as ${format.kind}`
  const channels = Object.entries(recording.channels)
  if (channels.some(([, force]) => force.length !== channels[0]?.[1].length))
    return 'channels of unequal length'
  if (!(recording.sampleRateHz > 0)) return `a rate of ${recording.sampleRateHz} Hz`
  if (result.notes.some(({ code }) => CORRECTIONS.has(code))) return null
  const slow = readSlowly(bytes, format, columnMap)
  if (!slow) return 'rows that are not whole, and no note'
  for (const [channel, force] of channels) {
    const expected = slow.channels[channel as keyof typeof slow.channels] ?? []
    if (expected.length !== force.length)
      return `${force.length} samples for ${expected.length} rows of ${channel}`
    const odd = force.findIndex(
      (newtons, i) => newtons !== Math.round((expected[i] ?? NaN) * 1000) / 1000 + 0,
    )
    if (odd >= 0) return `${force[odd]} N for ${expected[odd]} N in row ${odd + 1} of ${channel}`
  }
  return null
}

/** Reads `count` damaged files, each from a seed of its own. */
export function runMutations(count: number, firstSeed = 1): MutationReport {
  const files = wholeFiles()
  const report: MutationReport = {
    files: count,
    accepted: 0,
    equal: 0,
    noted: 0,
    needsMap: 0,
    slowestMs: 0,
    faults: [],
  }
  for (let seed = firstSeed; seed < firstSeed + count; seed++) {
    const random = seededRandom(seed)
    const bytes = mutated(random.pick(files), random)
    try {
      readOne(bytes, seed, report)
    } catch (error) {
      report.faults.push(`${seed}: threw ${String(error)}`)
    }
  }
  return report
}

function readOne(bytes: Uint8Array, seed: number, report: MutationReport): void {
  const start = performance.now()
  const result = readRecording(bytes, 'damaged.csv')
  const ms = performance.now() - start
  report.slowestMs = Math.max(report.slowestMs, ms)
  if (ms > LONGEST_MS) report.faults.push(`${seed}: took ${ms.toFixed(0)} ms`)
  if (!result.ok) {
    if (result.needsMap) report.needsMap++
    if (!readErrorCodes.includes(result.error.code))
      report.faults.push(`${seed}: unknown code ${result.error.code}`)
    return
  }
  report.accepted++
  const wrong = difference(bytes, result)
  if (wrong)
    report.faults.push(`${seed}: ${wrong} (notes: ${result.notes.map(({ code }) => code).join(', ')})`)
  else if (result.notes.some(({ code }) => CORRECTIONS.has(code))) report.noted++
  else report.equal++
}
