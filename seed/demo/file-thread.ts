import type { FileStyle } from '../synthetic/file-styles.ts'
import { makeJump } from '../synthetic/jump.ts'
import { recordJump } from '../synthetic/record.ts'
import { writeDelimited } from '../synthetic/write-delimited.ts'
import type { Recipe } from './stories.ts'

const durationS = 6

/** The bytes of a trial's file, made in a thread of its own: physics, plates, text. */
export default function makeFile({ recipe, style }: { recipe: Recipe; style: FileStyle }): Uint8Array {
  const { jump, plates, swapped, seed } = recipe
  const recording = recordJump(makeJump(jump, seed), { durationS }, plates, seed)
  const { left, right } = recording.channels
  const channels = swapped ? { left: right, right: left } : { left, right }
  return writeDelimited({ ...recording, channels }, style)
}
