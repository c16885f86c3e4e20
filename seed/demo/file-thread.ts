import type { FileStyle } from '../synthetic/file-styles.ts'
import { makeJump } from '../synthetic/jump.ts'
import { perform } from '../synthetic/perform.ts'
import { recordJump } from '../synthetic/record.ts'
import { writeDelimited } from '../synthetic/write-delimited.ts'
import type { AttemptsRecipe, Recipe } from './stories.ts'

const durationS = 6

interface FileOrder {
  recipe: Recipe | AttemptsRecipe
  style: FileStyle
}

/** The bytes of a file, made in a thread of its own: physics, plates, text. */
export default function makeFile({ recipe, style }: FileOrder): Uint8Array {
  return writeDelimited('attempts' in recipe ? recordAttempts(recipe) : recordOne(recipe), style)
}

function recordAttempts({ athlete, attempts, plates, seed }: AttemptsRecipe) {
  const performance = perform(athlete, attempts, seed)
  return recordJump(performance, { durationS: performance.endS }, plates, seed)
}

function recordOne({ jump, plates, swapped, seed }: Recipe) {
  const recording = recordJump(makeJump(jump, seed), { durationS }, plates, seed)
  const { left, right } = recording.channels
  return { ...recording, channels: swapped ? { left: right, right: left } : { left, right } }
}
