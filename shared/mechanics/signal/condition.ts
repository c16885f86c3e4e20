import type { ForceChannel, Note, Recording } from '../types.ts'
import type { Settings } from '../settings.ts'
import { runningSums, type RunningSums } from './running-mean.ts'
import { borrow } from './workspace.ts'

/** One plate's force in newtons, as recorded: to be read only, it may be the recording's own array. */
export interface Plate {
  channel: ForceChannel
  force: Float64Array
  /** The whole record was turned over because pressing down read negative. */
  flipped: boolean
  /** The record hardly moves: nothing stood on this plate, or it was not connected. */
  dead: boolean
  /** Samples in a row at exactly the greatest force. */
  flatTop: number
}

/** The force of a recording on an even time base, ready for the search of events. */
export interface Signal<P extends Plate = Plate> {
  sampleRateHz: number
  /** Sample interval, s. */
  dt: number
  length: number
  plates: P[]
  total: Float64Array
  /** Running sums of the total. */
  sums: RunningSums
  /** Samples that were no number or beyond any plate, filled by straight lines. */
  unreadable: number
}

/** Either a signal or the reason why there is none. */
export type Conditioned = { signal: Signal } | { problem: Note }

const fewestSamples = 20

function problem(code: string, sentence: string): Conditioned {
  return { problem: { code, sentence } }
}

/** Which channels carry the force: two feet where both are there, otherwise the one there is. */
function chooseChannels(recording: Recording): ForceChannel[] {
  const { left, right, single, total } = recording.channels
  if (left && right) return ['left', 'right']
  if (total) return ['total']
  if (single) return ['single']
  if (left) return ['left']
  return right ? ['right'] : []
}

/** What one pass over a channel tells. */
interface Survey {
  least: number
  greatest: number
  /** Every sample is a number within the limit. */
  readable: boolean
}

function survey(force: Float64Array, limit: number): Survey {
  const { length } = force
  let least = Infinity
  let greatest = -Infinity
  let sum = 0
  for (let i = 0; i < length; i++) {
    const value = force[i]
    if (value < least) least = value
    if (value > greatest) greatest = value
    sum += value
  }
  // A sum of readable numbers is a number; NaN passes both comparisons unseen but not the sum.
  return { least, greatest, readable: least >= -limit && greatest <= limit && !Number.isNaN(sum) }
}

/** Greatest number of samples in a row at exactly the greatest value. */
function longestFlatTop(force: Float64Array, greatest: number): number {
  let longest = 0
  for (let from = force.indexOf(greatest); from >= 0;) {
    let to = from + 1
    while (to < force.length && force[to] === greatest) to++
    longest = Math.max(longest, to - from)
    from = force.indexOf(greatest, to)
  }
  return longest
}

/**
 * Copies a channel, bridging samples that are not finite or beyond `limit` by straight lines. A record without one
 * readable sample becomes zeros. Answers how many were bridged.
 */
function bridgeUnreadable(from: Float64Array, to: Float64Array, limit: number): number {
  const { length } = to
  let unreadable = 0
  let lastGood = -1
  for (let i = 0; i < length; i++) {
    const value = from[i]
    if (!(value <= limit && value >= -limit)) {
      unreadable++
      continue
    }
    to[i] = value
    if (lastGood < i - 1) bridge(to, lastGood, i)
    lastGood = i
  }
  to.fill(lastGood >= 0 ? to[lastGood] : 0, lastGood + 1)
  return unreadable
}

function bridge(force: Float64Array, lastGood: number, nextGood: number): void {
  const start = lastGood >= 0 ? force[lastGood] : force[nextGood]
  const slope = lastGood >= 0 ? (force[nextGood] - start) / (nextGood - lastGood) : 0
  for (let i = lastGood + 1; i < nextGood; i++) force[i] = start + slope * (i - lastGood)
}

const levelSamples = 200
const some = new Float64Array(levelSamples)

/** Median of some 200 samples spread over the record: its usual level. */
export function usualLevel(force: Float64Array): number {
  const count = Math.min(levelSamples, force.length)
  const step = force.length / count
  for (let k = 0; k < count; k++) some[k] = force[Math.floor(k * step)]
  const sorted = count === levelSamples ? some.sort() : some.slice(0, count).sort()
  return sorted[count >> 1]
}

/**
 * Pressing down reads negative where the usual level is below zero and the largest force points the same way:
 * a push and a landing reach further from standing than the empty plate does.
 */
function isNegativeGoing(force: Float64Array, { least, greatest }: Survey, share: number): boolean {
  const wellBelow = -share * (greatest - least)
  if (least > wellBelow) return false
  const usual = usualLevel(force)
  return usual < wellBelow && usual - least > greatest - usual
}

function turnedOver(force: Float64Array, into: Float64Array): Float64Array {
  for (let i = 0; i < force.length; i++) into[i] = -force[i]
  return into
}

function conditionPlate(
  channel: ForceChannel,
  raw: Float64Array,
  settings: Settings,
): Plate & { unreadable: number } {
  let force = raw
  let unreadable = 0
  let range = survey(raw, settings.greatestForceN)
  if (!range.readable) {
    force = borrow(`bridged force of ${channel}`, raw.length)
    unreadable = bridgeUnreadable(raw, force, settings.greatestForceN)
    range = survey(force, settings.greatestForceN)
  }
  const dead = !(range.greatest - range.least > settings.smallestLoadN / 3)
  const flipped = !dead && isNegativeGoing(force, range, settings.negativeShare)
  if (flipped) force = turnedOver(force, borrow(`turned force of ${channel}`, raw.length))
  const flatTop = longestFlatTop(force, flipped ? -range.least : range.greatest)
  return { channel, force, flipped, dead, flatTop, unreadable }
}

/** The force of all plates together, with its running sums. */
function totalOf(plates: readonly Plate[]): { total: Float64Array; sums: RunningSums } {
  const first = plates[0].force
  if (plates.length === 1) return { total: first, sums: runningSums(first, 'sums of the total') }
  const second = plates[1].force
  const { length } = first
  const total = borrow('total', length)
  const sums = borrow('sums of the total', length + 1)
  const reference = first[0] + second[0]
  let sum = 0
  sums[0] = 0
  for (let i = 0; i < length; i++) {
    const newton = first[i] + second[i]
    total[i] = newton
    sum += newton - reference
    sums[i + 1] = sum
  }
  return { total, sums: { sums, reference, length } }
}

/**
 * Takes the force channels of a recording: bridges unreadable samples and counts them, turns over a plate that reads
 * negative; both in a copy, and the recording itself stays as it was.
 */
export function conditionRecording(recording: Recording, settings: Settings): Conditioned {
  const rate = recording.sampleRateHz
  if (!(rate > 0 && Number.isFinite(rate)))
    return problem(
      'rate-unknown',
      'The sample rate is not known, so no time can be told. Give the rate in hertz.',
    )
  const channels = chooseChannels(recording)
  if (channels.length === 0)
    return problem(
      'no-force-column',
      'The recording has no vertical force. Say which column holds the force.',
    )
  const raws = channels.map((channel) => recording.channels[channel] as Float64Array)
  const length = raws[0].length
  if (raws.some((raw) => raw.length !== length))
    return problem(
      'unequal-channels',
      'The two plates have different numbers of samples. Export the file again.',
    )
  if (length < fewestSamples)
    return problem(
      'too-short',
      `The recording has ${length} samples, too few for a jump. Record the whole trial.`,
    )

  const plates = channels.map((channel, i) => conditionPlate(channel, raws[i], settings))
  const unreadable = plates.reduce((sum, plate) => sum + plate.unreadable, 0)
  return { signal: { sampleRateHz: rate, dt: 1 / rate, length, plates, ...totalOf(plates), unreadable } }
}
