import type { Note } from '../../../../shared/mechanics/types.ts'
import { listed } from '../../../../shared/recordings/safe-text.ts'

export const archiveNotes = {
  cameInArchive: (archive: string, path: string): Note => ({
    code: 'from-archive',
    sentence: `The file came in the archive ${listed([archive])}, as ${listed([path])} there.`,
  }),
  unpacked: (files: number, skipped: number): Note => ({
    code: 'archive-unpacked',
    sentence: `The archive holds ${files} ${files === 1 ? 'file' : 'files'}, each read as a file of its own${skipped > 0 ? `; ${skipped} that computers add by themselves ${skipped === 1 ? 'was' : 'were'} left out` : ''}.`,
  }),
}
