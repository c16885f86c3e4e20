import type { Evidence } from './notes/note.ts'

/** How much a source can be leaned on, said plainly. */
export const evidenceWords: Record<Evidence, string> = {
  published: 'Published. Its abstract or opening was read for this note, not the whole text.',
  memory: 'From memory: the text was not read for this note. Take the source as provisional.',
  practice: 'Common practice: no single source fixes it.',
  definition: 'A definition: it follows from mechanics.',
}
