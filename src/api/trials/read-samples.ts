import type { ForceChannel } from '../../../shared/mechanics/types.ts'

export type Samples = Partial<Record<ForceChannel, Float64Array>>

/** The samples of a recording do not have the size that its description promises. */
export class SamplesDamaged extends Error {
  constructor(expected: number, seen: number) {
    super(`The recording should have ${expected} bytes and has ${seen}.`)
    this.name = 'SamplesDamaged'
  }
}

/** Bytes per value: little-endian int32, millinewtons. */
const valueBytes = 4

/**
 * Samples as the server sends them: channel after channel in the order given.
 * @returns newtons
 * @throws SamplesDamaged where bytes are missing or left over.
 */
export function readSamples(
  bytes: ArrayBuffer,
  channels: readonly ForceChannel[],
  sampleCount: number,
): Samples {
  const expected = channels.length * sampleCount * valueBytes
  if (bytes.byteLength !== expected) throw new SamplesDamaged(expected, bytes.byteLength)
  const view = new DataView(bytes)
  return Object.fromEntries(
    channels.map((channel, c) => [
      channel,
      Float64Array.from(
        { length: sampleCount },
        (_, i) => view.getInt32((c * sampleCount + i) * valueBytes, true) / 1000,
      ),
    ]),
  )
}
