import type { ForceChannel, Note, Recording } from '../../mechanics/types.ts'
import type { DraftMap } from '../columns/draft.ts'
import { ReadFault } from '../errors.ts'
import { fillBlanks } from '../fill-blanks.ts'
import { toMillinewtonPrecision } from '../force-precision.ts'
import { MAX_FILLED_SHARE, MAX_FORCE_N, MAX_GAP_S, MAX_SAMPLES, MIN_SAMPLES } from '../limits.ts'
import { readingNotes } from '../notes.ts'
import type { ColumnMap, MappedForce } from '../column-map.ts'
import type { ReadHints } from '../hints.ts'
import type { Metadata } from '../table/metadata.ts'
import type { Body } from '../table/table.ts'
import type { LineOfRow, TimeBase } from '../time-base.ts'
import { channelForce } from './channel-force.ts'
import { unitFactors } from './force-units.ts'
import { putUpright, wasTared } from './level-of-plates.ts'
import { withoutSentinels } from './sentinels.ts'
import { timeOfRows } from './time-of-rows.ts'
import type { OpenTime, Rows } from './time-of-rows.ts'

/** What a file's columns are, and what is known of them besides. */
export interface Source {
  time: OpenTime | null
  forces: MappedForce[]
  /** Of the map. */
  sampleRateHz?: number
  metadata: Metadata
  hints: ReadHints
}

/** The columns that are read: ascending, each once. */
export function wantedColumns({ time, forces }: Pick<DraftMap, 'time' | 'forces'>): number[] {
  const indices = [time?.index, time?.within?.index, ...forces.map((force) => force.index)]
  return [...new Set(indices.filter((index) => index !== undefined))].sort((a, b) => a - b)
}

interface Columns extends Rows {
  trimmed: number
  notes: Note[]
}

/** Leaves off rows at both ends that lack a stamp or a force. */
function trimEnds(columns: readonly Float64Array[]): { start: number; end: number } {
  const rows = columns[0]?.length ?? 0
  const complete = (row: number): boolean => columns.every((column) => !Number.isNaN(column[row]))
  let start = 0
  while (start < rows && !complete(start)) start++
  let end = rows
  while (end > start && !complete(end - 1)) end--
  return { start, end }
}

/** The columns without marks for missing samples, and without incomplete rows at the ends. */
function cleanRows(body: Body, wanted: readonly number[]): Columns {
  const notes: Note[] = []
  const cleaned = body.columns.map((column) => {
    const { values, found } = withoutSentinels(column)
    if (found) notes.push(readingNotes.sentinelsLeftOut(String(found.value), found.count))
    return values
  })
  const rows = cleaned[0]?.length ?? 0
  const { start, end } = trimEnds(cleaned)
  const isWhole = end - start === rows
  const kept = isWhole ? cleaned : cleaned.map((column) => column.subarray(start, end))
  return {
    count: end - start,
    columnOf: (index) => kept[wanted.indexOf(index)] ?? new Float64Array(0),
    lineOf: (row) => body.lineOf(start + row),
    trimmed: rows - (end - start),
    notes,
  }
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

function tooStrong(force: Float64Array, base: TimeBase, lineOf: LineOfRow): ReadFault {
  const sample = force.findIndex((newtons) => Math.abs(newtons) > MAX_FORCE_N)
  const line = lineOf(base.sampleOfRow ? base.sampleOfRow.indexOf(sample) : sample)
  const seen = `${force[sample]} N`
  return new ReadFault('corrupt-file', `Line ${line} holds ${seen}, more than any plate measures.`, {
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
  const sentence = `${filled} of ${base.length} samples are blank or unreadable${where}.`
  throw new ReadFault('corrupt-file', sentence, place)
}

interface Channels {
  channels: Recording['channels']
  filledSamples: number
  turned: ForceChannel[]
  tared: ForceChannel[]
}

/** Every channel on the even base: added up, filled, upright and rounded to 0.001 N. */
function channelsOf(
  forces: MappedForce[],
  rows: Columns,
  base: TimeBase,
  body: Body,
  factorOf: (force: MappedForce) => number,
): Channels {
  const made: Channels = { channels: {}, filledSamples: 0, turned: [], tared: [] }
  let longestRun = 0
  for (const channel of new Set(forces.map((force) => force.channel))) {
    const its = forces.filter((force) => force.channel === channel)
    const parts = its.map((force) => ({
      values: rows.columnOf(force.index),
      factor: factorOf(force) * (force.downward ? -1 : 1),
    }))
    const raw = channelForce(parts, base)
    if (raw.greatest > MAX_FORCE_N || raw.least < -MAX_FORCE_N) throw tooStrong(raw.force, base, rows.lineOf)
    let { force } = raw
    if (raw.hasBlanks) {
      const filled = fillBlanks(force)
      made.filledSamples = Math.max(made.filledSamples, filled.count)
      longestRun = Math.max(longestRun, filled.longestRun)
      force = filled.filled.map(toMillinewtonPrecision)
    }
    const isDownward = its.some((one) => one.downward)
    const isTurned = !isDownward && putUpright(force, raw)
    if (isTurned) made.turned.push(channel)
    if (wasTared(force, isTurned ? -raw.greatest : raw.least, base.sampleRateHz)) made.tared.push(channel)
    made.channels[channel] = force
  }
  checkFilled(made.filledSamples, longestRun, base, body)
  return made
}

/** What of the body itself is worth a note. */
function bodyNotes(body: Body): Note[] {
  return [
    ...(body.marks === 'comma-assumed' ? [readingNotes.decimalCommaAssumed()] : []),
    ...(body.cutLine ? [readingNotes.lastLineCut()] : []),
    ...(body.linesAfter.count > 0
      ? [readingNotes.linesLeftOut(body.linesAfter.count, body.linesAfter.first)]
      : []),
  ]
}

/**
 * Columns of numbers and what they are → a recording on an even time base, rounded to 0.001 N, and the map as it was
 * taken.
 * @throws ReadFault where time, units or numbers allow none
 */
export function buildRecording(
  source: Source,
  body: Body,
  wanted: readonly number[],
): { recording: Recording; columnMap: ColumnMap } {
  const { metadata, hints, sampleRateHz } = source
  if ((body.columns[0]?.length ?? 0) > MAX_SAMPLES) checkLength(MAX_SAMPLES + 1)
  const { factorOf, notes: unitNotes } = unitFactors(source.forces, metadata, hints)
  const rows = cleanRows(body, wanted)
  checkLength(rows.count)
  const mapRate = sampleRateHz === undefined ? {} : { sampleRateHz }
  const { base, time, notes: timeNotes } = timeOfRows(source.time, rows, metadata, mapRate, hints)
  checkLength(base.length)
  const { channels, filledSamples, turned, tared } = channelsOf(source.forces, rows, base, body, ({ unit }) =>
    factorOf(unit),
  )
  const notes = [
    ...unitNotes,
    ...timeNotes,
    ...rows.notes,
    ...(turned.length > 0 ? [readingNotes.turnedOver(turned)] : []),
    ...(tared.length > 0 ? [readingNotes.taredWithAthlete(tared)] : []),
    ...(filledSamples > 0 ? [readingNotes.samplesFilled(filledSamples, base.length)] : []),
    ...(rows.trimmed > 0 ? [readingNotes.endsTrimmed(rows.trimmed)] : []),
    ...bodyNotes(body),
  ]
  const forces = source.forces.map((force): MappedForce =>
    turned.includes(force.channel) ? { ...force, downward: true } : force,
  )
  return {
    recording: { sampleRateHz: base.sampleRateHz, channels, filledSamples, timeBaseError: base.error, notes },
    columnMap: { time, forces, ...mapRate },
  }
}
