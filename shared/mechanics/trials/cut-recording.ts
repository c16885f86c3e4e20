import type { Stretch } from '../events/unloaded.ts'
import type { ForceChannel, Recording } from '../types.ts'

/**
 * A part of a recording as a recording of its own, on the same samples. Where samples were filled is not known: the
 * part is charged with its share of them.
 */
export function cutRecording(recording: Recording, { from, to }: Stretch): Recording {
  const channels = Object.entries(recording.channels) as [ForceChannel, Float64Array][]
  const length = channels[0]?.[1].length ?? 1
  return {
    ...recording,
    filledSamples: Math.ceil((recording.filledSamples * (to - from)) / length),
    channels: Object.fromEntries(channels.map(([name, force]) => [name, force.subarray(from, to)])),
  }
}
