import type { Stretch } from '../events/unloaded.ts'
import type { ForceChannel, Recording } from '../types.ts'

/** A part of a recording as a recording of its own, on the same samples. What was filled or uneven is said of all of it. */
export function cutRecording(recording: Recording, { from, to }: Stretch): Recording {
  const channels = Object.entries(recording.channels) as [ForceChannel, Float64Array][]
  return {
    ...recording,
    channels: Object.fromEntries(channels.map(([name, force]) => [name, force.subarray(from, to)])),
  }
}
