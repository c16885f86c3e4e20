import { edges } from './edges.ts'
import { headings } from './headings.ts'
import { plates } from './plates.ts'
import { preambles } from './preambles.ts'
import type { MadeCase } from './text.ts'
import { times, units } from './units-and-times.ts'
import { writing } from './writing.ts'

const FIRST_NUMBER = 101

/** Every made case under the name of its folder. New ones go to the end of their list's file or get a list of their own. */
export const madeCases: (MadeCase & { folder: string })[] = [
  ...writing,
  ...preambles,
  ...headings,
  ...units,
  ...times,
  ...plates,
  ...edges,
].map((made, i) => ({
  ...made,
  folder: `${FIRST_NUMBER + i}-${made.name}`,
}))
