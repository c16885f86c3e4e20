import type { ForceChannel, Note, Recording } from '../../mechanics/types.ts'
import { ReadFault } from '../errors.ts'
import { fillBlanks } from '../fill-blanks.ts'
import { toMillinewtonPrecision } from '../force-precision.ts'
import { MAX_FILLED_SHARE, MAX_FORCE_N, MAX_GAP_S, MAX_SAMPLES, MIN_SAMPLES } from '../limits.ts'
import { readingNotes } from '../notes.ts'
import type { ColumnMap, ReadHints, TimeUnit } from '../result.ts'
import { listed } from '../safe-text.ts'
import { timeBaseOf } from '../time-base.ts'
import type { LineOfRow, TimeBase } from '../time-base.ts'
import type { Body } from './body.ts'
import type { ProposedMap } from './column-map.ts'

/** A rate outside these belongs to no force plate: what a step in an unnamed time unit is judged by. */
const PLATE_RATES_HZ = { slowest: 50, fastest: 20_000 }

interface TrimmedBody extends Body {
  trimmed: number
  lineOf: LineOfRow
}

/** Leaves off rows at both ends that lack a stamp or a force. */
function trimEnds(body: Body, bodyLine: number): TrimmedBody {
  const { columns } = body
  const rows = columns[0]?.length ?? 0
  const complete = (row: number): boolean => columns.every((column) => !Number.isNaN(column[row]))
  let start = 0
  while (start < rows && !complete(start)) start++
  let end = rows
  while (end > start && !complete(end - 1)) end--
  const kept = end - start === rows ? columns : columns.map((column) => column.slice(start, end))
  return { ...body, columns: kept, trimmed: rows - (end - start), lineOf: (row) => bodyLine + start + row }
}

function checkLength(rows: number): void {
  if (rows > MAX_SAMPLES) {
    const most = MAX_SAMPLES.toLocaleString('en-GB')
    throw new ReadFault('too-large', `The file has more than ${most} samples, the most that is read.`)
  }
  if (rows < MIN_SAMPLES) {
    const held = rows === 1 ? 'line holds a complete sample' : 'lines hold complete samples'
    throw new ReadFault('too-few-samples', `Only ${rows} ${held}.`)
  }
}

/** s or ms for a time column that names no unit, where one of the two only fits a plate's rate. */
function unitByStep(stamps: Float64Array, name: string): TimeUnit {
  const step = ((stamps[stamps.length - 1] ?? 0) - (stamps[0] ?? 0)) / (stamps.length - 1)
  const fits = (seconds: number): boolean =>
    1 / seconds >= PLATE_RATES_HZ.slowest && 1 / seconds <= PLATE_RATES_HZ.fastest
  if (fits(step)) return 's'
  if (fits(step / 1000)) return 'ms'
  const sentence = `The time column ${listed([name])} names no unit, and steps of ${Number(step.toPrecision(4))} fit neither s nor ms.`
  throw new ReadFault('rate-unknown', sentence)
}

function timeBaseFrom(
  map: ProposedMap,
  body: TrimmedBody,
  hints: ReadHints,
): { base: TimeBase; time: ColumnMap['time']; notes: Note[] } {
  const rows = body.columns[0]?.length ?? 0
  if (!map.time) {
    const { sampleRateHz } = hints
    if (sampleRateHz === undefined)
      throw new ReadFault('rate-unknown', 'The file has no time column, so its sampling rate is not known.')
    const base = { sampleRateHz, error: 0, length: rows, sampleOfRow: null, coarseStepS: null }
    return { base, time: null, notes: [readingNotes.rateFromHint(sampleRateHz)] }
  }
  const stamps = fillBlanks(body.columnOf(map.time.index, body.columns)).filled
  const unit = map.time.unit ?? unitByStep(stamps, map.time.name)
  const base = timeBaseOf(unit === 'ms' ? stamps.map((stamp) => stamp / 1000) : stamps, body.lineOf)
  const notes: Note[] = []
  if (map.time.unit === null) notes.push(readingNotes.timeUnitAssumed(unit, base.sampleRateHz))
  if (base.coarseStepS !== null)
    notes.push(readingNotes.coarseTime(`${Number(base.coarseStepS.toPrecision(3))} s`))
  return { base, time: { ...map.time, unit }, notes }
}

/** One channel's force on the even base in newtons, NaN where the file has none. */
function channelForce(columns: ColumnMap['forces'], body: TrimmedBody, base: TimeBase): Float64Array {
  const force = new Float64Array(base.length)
  if (base.sampleOfRow) force.fill(NaN)
  const rows = body.columns[0]?.length ?? 0
  columns.forEach((column, part) => {
    const values = body.columnOf(column.index, body.columns)
    const factor = column.unit === 'kN' ? 1000 : 1
    for (let row = 0; row < rows; row++) {
      const sample = base.sampleOfRow ? (base.sampleOfRow[row] ?? 0) : row
      const newtons = (values[row] ?? NaN) * factor
      force[sample] = part === 0 ? newtons : (force[sample] ?? NaN) + newtons
    }
  })
  return force
}

function checkForce(force: Float64Array, base: TimeBase, lineOf: LineOfRow): void {
  const sample = force.findIndex((newtons) => Math.abs(newtons) > MAX_FORCE_N)
  if (sample < 0) return
  const line = lineOf(base.sampleOfRow ? base.sampleOfRow.indexOf(sample) : sample)
  const seen = `${force[sample]} N`
  throw new ReadFault('corrupt-file', `Line ${line} holds ${seen}, more than any plate measures.`, {
    line,
    seen,
  })
}

function checkFilled(filled: number, longestRun: number, base: TimeBase, body: Body): void {
  if (filled <= MAX_FILLED_SHARE * base.length && longestRun <= MAX_GAP_S * base.sampleRateHz) return
  const place = body.firstUnreadable ?? {}
  const where = body.firstUnreadable
    ? `, the first in line ${body.firstUnreadable.line} (“${body.firstUnreadable.seen}”)`
    : ''
  throw new ReadFault(
    'corrupt-file',
    `${filled} of ${base.length} samples are blank or unreadable${where}.`,
    place,
  )
}

/** Columns of numbers and what the headings say of them → a recording on an even time base, rounded to 0.001 N. */
export function buildRecording(
  map: ProposedMap,
  whole: Body,
  bodyLine: number,
  hints: ReadHints,
): { recording: Recording; columnMap: ColumnMap } {
  const rows = whole.columns[0]?.length ?? 0
  if (rows > MAX_SAMPLES) checkLength(rows)
  const body = trimEnds(whole, bodyLine)
  checkLength(body.columns[0]?.length ?? 0)
  const { base, time, notes } = timeBaseFrom(map, body, hints)
  checkLength(base.length)
  const channels: Recording['channels'] = {}
  let [filledSamples, longestRun] = [0, 0]
  for (const channel of new Set(map.forces.map((force): ForceChannel => force.channel))) {
    const raw = channelForce(
      map.forces.filter((force) => force.channel === channel),
      body,
      base,
    )
    checkForce(raw, base, body.lineOf)
    const { filled, count, longestRun: run } = fillBlanks(raw)
    filledSamples = Math.max(filledSamples, count)
    longestRun = Math.max(longestRun, run)
    channels[channel] = filled.map(toMillinewtonPrecision)
  }
  checkFilled(filledSamples, longestRun, base, body)
  if (filledSamples > 0) notes.push(readingNotes.samplesFilled(filledSamples, base.length))
  if (body.trimmed > 0) notes.push(readingNotes.endsTrimmed(body.trimmed))
  return {
    recording: {
      sampleRateHz: base.sampleRateHz,
      channels,
      filledSamples,
      timeBaseError: base.error,
      notes: [...map.notes, ...notes],
    },
    columnMap: { time, forces: map.forces },
  }
}
