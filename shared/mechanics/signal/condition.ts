import type { ForceChannel, Note, Recording } from '../types.ts'
import type { Settings } from '../settings.ts'
import { borrow } from './workspace.ts'

/** One plate's force in newtons, a copy that the engine may correct. */
export interface Plate {
  channel: ForceChannel
  force: Float64Array
  /** Zero offset taken off, N. */
  offsetN: number
  /** The whole record was turned over because pressing down read negative. */
  flipped: boolean
  /** The record hardly moves: nothing stood on this plate, or it was not connected. */
  dead: boolean
  /** Samples in a row at exactly the greatest force. */
  flatTop: number
}

/** The force of a recording on an even time base, ready for the search of events. */
export interface Signal {
  sampleRateHz: number
  /** Sample interval, s. */
  dt: number
  length: number
  plates: Plate[]
  total: Float64Array
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
  unreadable: number
  least: number
  greatest: number
  /** Samples in a row at exactly the greatest value. */
  flatTop: number
}

/**
 * Copies a channel times `sign`, bridging samples that are not finite or beyond `limit` by straight lines. A record
 * without one readable sample becomes zeros.
 */
function copyReadable(from: Float64Array, to: Float64Array, limit: number, sign: 1 | -1): Survey {
  const { length } = to
  let unreadable = 0
  let lastGood = -1
  let least = Infinity
  let greatest = -Infinity
  let run = 0
  let flatTop = 0
  for (let i = 0; i < length; i++) {
    const value = sign * from[i]
    if (!(value <= limit && value >= -limit)) {
      unreadable++
      run = 0
      continue
    }
    to[i] = value
    if (lastGood < i - 1) bridge(to, lastGood, i)
    lastGood = i
    if (value < least) least = value
    if (value > greatest) {
      greatest = value
      run = 1
      flatTop = 1
    } else if (value === greatest) {
      run++
      if (run > flatTop) flatTop = run
    } else run = 0
  }
  to.fill(lastGood >= 0 ? to[lastGood] : 0, lastGood + 1)
  return { unreadable, least, greatest, flatTop }
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
function isNegativeGoing(force: Float64Array, least: number, greatest: number): boolean {
  if (least > -0.1 * (greatest - least)) return false
  const usual = usualLevel(force)
  return usual < -0.1 * (greatest - least) && usual - least > greatest - usual
}

function conditionPlate(
  channel: ForceChannel,
  raw: Float64Array,
  settings: Settings,
): Plate & { unreadable: number } {
  const force = borrow(`force of ${channel}`, raw.length)
  let survey = copyReadable(raw, force, settings.greatestForceN, 1)
  const flipped = isNegativeGoing(force, survey.least, survey.greatest)
  if (flipped) survey = copyReadable(raw, force, settings.greatestForceN, -1)
  const dead = !(survey.greatest - survey.least > settings.smallestLoadN / 3)
  return { channel, force, offsetN: 0, flipped, dead, flatTop: survey.flatTop, unreadable: survey.unreadable }
}

/** Takes offsets off the plates' force and writes the force of all plates together. */
export function addUp(plates: readonly Plate[], total: Float64Array, offsets: readonly number[]): void {
  const { length } = total
  const first = plates[0].force
  const second = plates.length > 1 ? plates[1].force : null
  const ofFirst = offsets[0]
  const ofSecond = offsets[1] ?? 0
  if (second === null) for (let i = 0; i < length; i++) total[i] = first[i] -= ofFirst
  else for (let i = 0; i < length; i++) total[i] = (first[i] -= ofFirst) + (second[i] -= ofSecond)
}

/**
 * Takes the force channels of a recording as copies: bridges unreadable samples and counts them, turns over a
 * plate that reads negative. The recording itself stays as it was.
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

  const conditioned = channels.map((channel, i) => conditionPlate(channel, raws[i], settings))
  const total = borrow('total', length)
  addUp(conditioned, total, [0, 0])
  const unreadable = conditioned.reduce((sum, plate) => sum + plate.unreadable, 0)
  return { signal: { sampleRateHz: rate, dt: 1 / rate, length, plates: conditioned, total, unreadable } }
}
