import type { Note } from '../../mechanics/types.ts'
import { listed } from '../safe-text.ts'

/** What reading a workbook leaves out. */
export const workbookNotes = {
  otherRecordings: (read: string, others: string[]): Note => ({
    code: 'other-sheets-not-read',
    sentence: `The sheet ${listed([read])} was read; ${listed(others)} ${others.length === 1 ? 'holds a recording' : 'hold recordings'} as well and ${others.length === 1 ? 'was' : 'were'} not read. Save each sheet as a workbook of its own to have all of them.`,
  }),
  formulasWithoutResult: (count: number): Note => ({
    code: 'formulas-without-result',
    sentence: `The file holds no result of ${count} ${count === 1 ? 'formula' : 'formulas'}; ${count === 1 ? 'its cell was' : 'their cells were'} taken as blank. Opening and saving the workbook where it was made fills them.`,
  }),
}
