import type { Note } from '../../mechanics/types.ts'
import { timeUnitByStep } from '../columns/guess.ts'
import { ReadFault } from '../errors.ts'
import { fillBlanks } from '../fill-blanks.ts'
import { readingNotes } from '../notes.ts'
import type { ColumnMap, MappedTime, TimeUnit } from '../column-map.ts'
import type { ReadHints } from '../hints.ts'
import { listed } from '../safe-text.ts'
import type { Metadata } from '../table/metadata.ts'
import { evenTimeBase, timeBaseOf } from '../time-base.ts'
import type { LineOfRow, TimeBase } from '../time-base.ts'

/** A time column whose unit may still be open, and whose frames have not been counted. */
export interface OpenTime extends Omit<MappedTime, 'unit' | 'within'> {
  unit: TimeUnit | null
  within?: Omit<NonNullable<MappedTime['within']>, 'samplesPerFrame'>
}

/** The rows that hold samples. */
export interface Rows {
  count: number
  columnOf: (index: number) => Float64Array
  lineOf: LineOfRow
}

export interface TimeOfRows {
  base: TimeBase
  time: MappedTime | null
  notes: Note[]
}

/** Two rates further apart than this share are not the same one, rounded. Ours. */
const SAME_RATE = 0.01

/** The rate that is stated: by the file, by its map, by whoever sends it, in this order. */
function statedRate(
  metadata: Metadata,
  map: Pick<ColumnMap, 'sampleRateHz'>,
  hints: ReadHints,
): { rateHz: number; note: Note } | null {
  if (metadata.sampleRateHz !== undefined)
    return { rateHz: metadata.sampleRateHz, note: readingNotes.rateFromFile(metadata.sampleRateHz) }
  if (map.sampleRateHz !== undefined)
    return { rateHz: map.sampleRateHz, note: readingNotes.rateFromMap(map.sampleRateHz) }
  if (hints.sampleRateHz !== undefined)
    return { rateHz: hints.sampleRateHz, note: readingNotes.rateFromHint(hints.sampleRateHz) }
  return null
}

function unitByStep(stamps: Float64Array, name: string): TimeUnit {
  const step = ((stamps[stamps.length - 1] ?? 0) - (stamps[0] ?? 0)) / (stamps.length - 1)
  const unit = timeUnitByStep(step)
  if (unit) return unit
  const sentence = `The time column ${listed([name])} names no unit, and steps of ${Number(step.toPrecision(4))} fit neither s nor ms.`
  throw new ReadFault('rate-unknown', sentence)
}

const SECONDS: Record<Exclude<TimeUnit, 'samples'>, number> = { s: 1, clock: 1, ms: 1e-3, us: 1e-6, min: 60 }

const inSeconds = (stamps: Float64Array, unit: Exclude<TimeUnit, 'samples'>): Float64Array => {
  if (unit === 'ms') return stamps.map((stamp) => stamp / 1000)
  if (unit === 'us') return stamps.map((stamp) => stamp / 1e6)
  return SECONDS[unit] === 1 ? stamps : stamps.map((stamp) => stamp * SECONDS[unit])
}

/** Times of day that go past midnight go on. */
function pastMidnight(stamps: Float64Array): Float64Array {
  let days = 0
  return stamps.map((stamp, i) => {
    if (i > 0 && stamp - (stamps[i - 1] ?? 0) < -43_200) days++
    return stamp + days * 86_400
  })
}

function hasBlank(values: Float64Array): boolean {
  for (let i = 0; i < values.length; i++) if (Number.isNaN(values[i])) return true
  return false
}

/** Stamps without blanks; those that had to be put in between others are noted. */
function withoutBlanks(stamps: Float64Array): { filled: Float64Array; notes: Note[] } {
  if (!hasBlank(stamps)) return { filled: stamps, notes: [] }
  const { filled, count } = fillBlanks(stamps)
  return { filled, notes: [readingNotes.stampsFilled(count)] }
}

function fromStamps(time: OpenTime, rows: Rows, metadata: Metadata): TimeOfRows {
  const raw = rows.columnOf(time.index)
  const { filled: whole, notes } = withoutBlanks(raw)
  const unit = time.unit ?? unitByStep(whole, time.name)
  if (unit === 'samples') throw new RangeError('A count of samples is no time stamp.')
  const seconds = inSeconds(unit === 'clock' ? pastMidnight(whole) : whole, unit)
  const base = timeBaseOf(seconds, rows.lineOf)
  if (time.unit === null) notes.push(readingNotes.timeUnitAssumed(unit, base.sampleRateHz))
  const stated = metadata.sampleRateHz
  const agrees = stated !== undefined && Math.abs(stated - base.sampleRateHz) <= SAME_RATE * stated
  if (stated !== undefined && !agrees) notes.push(readingNotes.rateDisagrees(stated, base.sampleRateHz))
  if (base.coarseStepS !== null)
    notes.push(readingNotes.coarseTime(`${Number(base.coarseStepS.toPrecision(3))} s`))
  const { index, name } = time
  // Coarse stamps leave the rate open within a little; what the file states beside them is exact.
  const settled = agrees && base.coarseStepS !== null ? { ...base, sampleRateHz: stated } : base
  return { base: settled, time: { index, name, unit }, notes }
}

/** Numbers of samples, out of frames and the samples within them where there are both. */
function counted(time: OpenTime, rows: Rows): { counts: Float64Array; within: MappedTime['within'] } {
  if (!time.within) return { counts: rows.columnOf(time.index), within: undefined }
  const inner = rows.columnOf(time.within.index)
  let [least, greatest] = [Infinity, -Infinity]
  for (const value of inner) {
    if (value < least) least = value
    if (value > greatest) greatest = value
  }
  const samplesPerFrame = greatest - least + 1
  const counts = rows.columnOf(time.index).map((frame, i) => frame * samplesPerFrame + (inner[i] ?? NaN))
  return { counts, within: { ...time.within, samplesPerFrame } }
}

function fromCounts(
  time: OpenTime,
  rows: Rows,
  metadata: Metadata,
  map: Pick<ColumnMap, 'sampleRateHz'>,
  hints: ReadHints,
): TimeOfRows {
  const { counts: raw, within } = counted(time, rows)
  const { filled: counts, notes } = withoutBlanks(raw)
  const perFrame = within?.samplesPerFrame ?? 1
  const frames = metadata.frameRateHz
  const fromFrames =
    frames === undefined
      ? null
      : { rateHz: frames * perFrame, note: readingNotes.rateFromFile(frames * perFrame) }
  const stated = statedRate(metadata, {}, {}) ?? fromFrames ?? statedRate(metadata, map, hints)
  if (!stated) {
    const sentence = `The column ${listed([time.name])} counts samples, and nothing states how many there are in a second.`
    throw new ReadFault('rate-unknown', sentence, { column: time.index + 1 })
  }
  const { rateHz } = stated
  const base = timeBaseOf(
    counts.map((count) => count / rateHz),
    rows.lineOf,
  )
  if (Math.abs(base.sampleRateHz - rateHz) > SAME_RATE * rateHz) {
    const sentence = `The column ${listed([time.name])} does not count up by one from row to row.`
    throw new ReadFault('uneven-time', sentence, { column: time.index + 1 })
  }
  const { index, name } = time
  return {
    base: { ...base, sampleRateHz: rateHz, coarseStepS: null },
    time: { index, name, unit: 'samples', ...(within ? { within } : {}) },
    notes: [stated.note, ...notes],
  }
}

/**
 * The even time base under a file's rows: by time stamps, by numbers of samples, or by the stated rate alone.
 * @throws ReadFault `rate-unknown` where nothing states the rate; `uneven-time`
 */
export function timeOfRows(
  time: OpenTime | null,
  rows: Rows,
  metadata: Metadata,
  map: Pick<ColumnMap, 'sampleRateHz'>,
  hints: ReadHints,
): TimeOfRows {
  if (time && time.unit !== 'samples') return fromStamps(time, rows, metadata)
  if (time) return fromCounts(time, rows, metadata, map, hints)
  const stated = statedRate(metadata, map, hints)
  if (!stated)
    throw new ReadFault('rate-unknown', 'The file has no time column, and nothing states its sampling rate.')
  return { base: evenTimeBase(stated.rateHz, rows.count), time: null, notes: [stated.note] }
}
