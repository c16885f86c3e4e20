import { ReadFault } from '../errors.ts'
import { MAX_SAMPLES } from '../limits.ts'
import { cutShort } from './binary.ts'
import { BLOCK_BYTES, type C3dHeader, startOfBlock } from './header.ts'
import type { Parameters } from './parameters.ts'

/** One analog channel: value = (raw − offset) · scale, with the general scale in it, for whole numbers and floats. */
export interface AnalogChannel {
  label: string
  unit: string
  scale: number
  offset: number
}

/** Where the analog samples stand and what they mean. */
export interface AnalogData {
  rateHz: number
  frames: number
  samplesPerFrame: number
  channels: AnalogChannel[]
  /** First byte of the data section. */
  dataAt: number
  frameBytes: number
  /** Bytes of the points, which stand first in every frame. */
  pointBytes: number
  /** Whole numbers without sign (ANALOG:FORMAT). */
  isUnsigned: boolean
}

/** A rate of the header and one of the parameters further apart than this, as a fraction, are two rates. Ours. */
const RATE_TOLERANCE = 0.001
/** More frames than this do not fit the 16 bits of POINT:FRAMES. */
const FULL_WORD = 65_535

/** Above 255 elements an array goes on in another parameter: SCALE, SCALE2, SCALE3. */
function continued<T>(name: string, read: (name: string) => T[]): T[] {
  const all = read(name)
  for (let n = 2; ; n++) {
    const more = read(`${name}${n}`)
    if (more.length === 0) return all
    all.push(...more)
  }
}

function channelsOf(parameters: Parameters, count: number, isUnsigned: boolean): AnalogChannel[] {
  const labels = continued('ANALOG:LABELS', (name) => parameters.texts(name))
  const units = continued('ANALOG:UNITS', (name) => parameters.texts(name))
  const scales = continued('ANALOG:SCALE', (name) => parameters.numbers(name, true))
  const offsets = continued('ANALOG:OFFSET', (name) => parameters.numbers(name, !isUnsigned))
  const general = parameters.number('ANALOG:GEN_SCALE', true) ?? 1
  if (scales.length < count)
    throw new ReadFault(
      'corrupt-file',
      `The file gives a scale to ${scales.length} of its ${count} analog channels.`,
    )
  return Array.from({ length: count }, (_, i) => ({
    label: labels[i] ?? '',
    unit: units[i] ?? '',
    scale: (scales[i] ?? NaN) * general,
    offset: offsets[i] ?? 0,
  }))
}

/** ANALOG:RATE, or frame rate times samples a frame where it is not there. */
function rateOf(header: C3dHeader, parameters: Parameters): number {
  const byHeader = header.frameRateHz * header.samplesPerFrame
  const stated = parameters.number('ANALOG:RATE') ?? 0
  const isRate = (rate: number): boolean => Number.isFinite(rate) && rate > 0
  if (!isRate(stated) && !isRate(byHeader))
    throw new ReadFault('rate-unknown', 'The file gives no sampling rate for its analog channels.')
  if (!isRate(stated)) return byHeader
  if (isRate(byHeader) && Math.abs(stated - byHeader) > RATE_TOLERANCE * stated) {
    const [one, other] = [stated, byHeader].map((rate) => Number(rate.toPrecision(6)))
    throw new ReadFault('rate-unknown', `The file gives two sampling rates: ${one} Hz and ${other} Hz.`)
  }
  return stated
}

/** A count of 32 bits in two words, the lower first (TRIAL:ACTUAL_START_FIELD and ACTUAL_END_FIELD). */
function longField(parameters: Parameters, name: string): number | null {
  const [low, high] = parameters.numbers(name)
  return low === undefined ? null : low + 65_536 * (high ?? 0)
}

/** Every count of frames that the file gives, the best first; a full word of 16 bits says only "more". */
function statedFrames({ firstFrame, lastFrame }: C3dHeader, parameters: Parameters): number[] {
  const short = parameters.number('POINT:FRAMES')
  const first = longField(parameters, 'TRIAL:ACTUAL_START_FIELD')
  const last = longField(parameters, 'TRIAL:ACTUAL_END_FIELD')
  const counts = [
    short === FULL_WORD ? null : short,
    parameters.number('POINT:LONG_FRAMES'),
    first === null || last === null ? null : last - first + 1,
    lastFrame === FULL_WORD ? null : lastFrame - firstFrame + 1,
  ]
  return counts.flatMap((count) => (count !== null && count > 0 ? [Math.floor(count)] : []))
}

/**
 * The first stated count that the length of the data bears out: zeros may fill up its last block, and 16 bits may
 * have run over. Without any, as many as there is room for.
 */
function framesOf(stated: number[], data: { bytes: number; frameBytes: number }): number {
  const room = Math.floor(data.bytes / data.frameBytes)
  const [best] = stated
  if (best === undefined) return room
  const fitting = stated.find((frames) => {
    const beyond = data.bytes - frames * data.frameBytes
    return beyond >= 0 && beyond < BLOCK_BYTES + data.frameBytes
  })
  if (fitting !== undefined) return fitting
  const sentence =
    best > room
      ? `The file says that it holds ${best} frames, and ends after ${room}.`
      : `The file says that it holds ${best} frames, and goes on for ${room}.`
  throw new ReadFault('corrupt-file', sentence)
}

/** @throws ReadFault where the header, the parameters and the length of the file do not go together */
export function readAnalog(header: C3dHeader, parameters: Parameters): AnalogData {
  const { analogPerFrame, samplesPerFrame, binary } = header
  const used = parameters.number('ANALOG:USED')
  const count = samplesPerFrame > 0 ? analogPerFrame / samplesPerFrame : 0
  if (count === 0)
    throw new ReadFault(
      'no-force-column',
      'The file is a C3D file without analog channels, so it holds no force.',
    )
  if (!Number.isInteger(count) || (used !== null && used !== count)) {
    const sentence = `The file says at one place that it has ${used ?? 'other'} analog channels, and at another ${Number(count.toFixed(2))}.`
    throw new ReadFault('corrupt-file', sentence)
  }
  const dataAt = header.dataAt ?? startOfBlock(parameters.number('POINT:DATA_START') ?? 0)
  if (dataAt < BLOCK_BYTES || dataAt >= binary.length) throw cutShort('its parameters: no data follow')
  const wordBytes = header.isFloat ? 4 : 2
  const frameBytes = (4 * header.points + analogPerFrame) * wordBytes
  const frames = framesOf(statedFrames(header, parameters), { bytes: binary.length - dataAt, frameBytes })
  if (frames * samplesPerFrame > MAX_SAMPLES) {
    const most = MAX_SAMPLES.toLocaleString('en-GB')
    throw new ReadFault('too-large', `The file has more than ${most} samples, the most that is read.`)
  }
  const isUnsigned = parameters.text('ANALOG:FORMAT').toUpperCase() === 'UNSIGNED'
  return {
    rateHz: rateOf(header, parameters),
    frames,
    samplesPerFrame,
    channels: channelsOf(parameters, count, isUnsigned),
    dataAt,
    frameBytes,
    pointBytes: 4 * header.points * wordBytes,
    isUnsigned,
  }
}

/** A channel's part in a sum, `index` counted from 0. */
export interface Share {
  index: number
  factor: number
}

/** The sum of channels in their units, each times its factor: a sample a value. NaN where a sample is no number. */
export function sumOfChannels(header: C3dHeader, data: AnalogData, shares: readonly Share[]): Float64Array {
  const { binary, isFloat } = header
  const { frames, samplesPerFrame, channels } = data
  const wordBytes = isFloat ? 4 : 2
  const sum = new Float64Array(frames * samplesPerFrame)
  for (const { index, factor } of shares) {
    const channel = channels[index]
    if (!channel) throw new RangeError(`There is no analog channel ${index + 1}.`)
    const { offset, scale } = channel
    let sample = 0
    for (let frame = 0; frame < frames; frame++) {
      let at = data.dataAt + frame * data.frameBytes + data.pointBytes + index * wordBytes
      for (let k = 0; k < samplesPerFrame; k++, sample++, at += channels.length * wordBytes) {
        const raw = isFloat ? binary.float32(at) : data.isUnsigned ? binary.uint16(at) : binary.int16(at)
        sum[sample] = (sum[sample] ?? 0) + (raw - offset) * scale * factor
      }
    }
  }
  return sum
}
