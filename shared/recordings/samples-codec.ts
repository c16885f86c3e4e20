import type { ForceChannel, Note, Recording } from '../mechanics/types.ts'

/**
 * The stored form of a recording's samples: whole millinewtons, differences from sample to sample, zigzag (small
 * magnitudes to small numbers), and the four bytes of each number in planes of their own. The upper planes are
 * then nearly all zero, which the caller's deflate step turns into next to nothing (8 s of two plates at 1000 Hz:
 * 31 kB).
 *
 * Layout, little endian: version u8, channels u8 (a bit each in the order below), 2 spare bytes, samples u32,
 * filled samples u32, 4 spare bytes, sample rate f64, time base error f64; then for each channel 4 planes of
 * `samples` bytes, the lowest byte first.
 */
const VERSION = 1
const HEADER_BYTES = 32
const CHANNEL_ORDER: readonly ForceChannel[] = ['left', 'right', 'single', 'total']

function writePlanes(force: Float64Array, out: Uint8Array): void {
  const n = force.length
  let before = 0
  for (let i = 0; i < n; i++) {
    const millinewtons = Math.round((force[i] ?? 0) * 1000)
    const difference = millinewtons - before
    before = millinewtons
    const zigzag = (difference << 1) ^ (difference >> 31)
    out[i] = zigzag
    out[i + n] = zigzag >>> 8
    out[i + 2 * n] = zigzag >>> 16
    out[i + 3 * n] = zigzag >>> 24
  }
}

function readPlanes(planes: Uint8Array, n: number): Float64Array {
  const force = new Float64Array(n)
  let millinewtons = 0
  for (let i = 0; i < n; i++) {
    const zigzag =
      (planes[i] ?? 0) |
      ((planes[i + n] ?? 0) << 8) |
      ((planes[i + 2 * n] ?? 0) << 16) |
      ((planes[i + 3 * n] ?? 0) << 24)
    millinewtons += (zigzag >>> 1) ^ -(zigzag & 1)
    force[i] = millinewtons / 1000
  }
  return force
}

/**
 * A recording's samples as bytes, without its notes. Forces must be rounded to 0.001 N, as reading leaves them,
 * and below the reader's limit; then nothing is lost.
 */
export function encodeSamples(recording: Recording): Uint8Array {
  const present = CHANNEL_ORDER.flatMap((channel) => recording.channels[channel] ?? [])
  const n = present[0]?.length ?? 0
  const out = new Uint8Array(HEADER_BYTES + present.length * 4 * n)
  const header = new DataView(out.buffer, 0, HEADER_BYTES)
  header.setUint8(0, VERSION)
  header.setUint8(
    1,
    CHANNEL_ORDER.reduce((bits, channel, i) => bits | (recording.channels[channel] ? 1 << i : 0), 0),
  )
  header.setUint32(4, n, true)
  header.setUint32(8, recording.filledSamples, true)
  header.setFloat64(16, recording.sampleRateHz, true)
  header.setFloat64(24, recording.timeBaseError, true)
  present.forEach((force, i) => {
    if (force.length !== n) throw new RangeError('The channels of a recording must have one length.')
    writePlanes(force, out.subarray(HEADER_BYTES + i * 4 * n, HEADER_BYTES + (i + 1) * 4 * n))
  })
  return out
}

/**
 * The recording that `encodeSamples` wrote, bit for bit; `notes` are kept apart from the samples.
 * @throws RangeError when the bytes are no such form, or cut
 */
export function decodeSamples(bytes: Uint8Array, notes: Note[] = []): Recording {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  if (bytes.length < HEADER_BYTES || view.getUint8(0) !== VERSION)
    throw new RangeError('These bytes are no stored samples.')
  const present = CHANNEL_ORDER.filter((_, i) => view.getUint8(1) & (1 << i))
  const n = view.getUint32(4, true)
  if (bytes.length !== HEADER_BYTES + present.length * 4 * n)
    throw new RangeError('The stored samples are cut.')
  const channels: Recording['channels'] = {}
  present.forEach((channel, i) => {
    channels[channel] = readPlanes(
      bytes.subarray(HEADER_BYTES + i * 4 * n, HEADER_BYTES + (i + 1) * 4 * n),
      n,
    )
  })
  return {
    sampleRateHz: view.getFloat64(16, true),
    channels,
    filledSamples: view.getUint32(8, true),
    timeBaseError: view.getFloat64(24, true),
    notes,
  }
}
