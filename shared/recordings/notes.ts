import type { Note } from '../mechanics/types.ts'
import { listed } from './safe-text.ts'

/** What was assumed, corrected or left out while reading: one maker a code, so that no wording is written twice. */
export const readingNotes = {
  pathRemoved: (name: string): Note => ({
    code: 'path-removed',
    sentence: `The file's name held a folder path, which was left off: ${listed([name])} is kept.`,
  }),
  feetUnknown: (headings: string[]): Note => ({
    code: 'feet-unknown',
    sentence: `The headings ${listed(headings)} name no foot, so the two plates were added up and no side is told apart.`,
  }),
  oneFootOnly: (heading: string): Note => ({
    code: 'one-foot-only',
    sentence: `Only ${listed([heading])} holds a force, so it was read as a single plate.`,
  }),
  columnsSummed: (headings: string[], channel: string): Note => ({
    code: 'columns-summed',
    sentence: `The columns ${listed(headings)} were added up to the ${channel} plate.`,
  }),
  columnsIgnored: (headings: string[]): Note => ({
    code: 'columns-ignored',
    sentence: `Not used: ${headings.length === 1 ? 'the column' : 'the columns'} ${listed(headings)}.`,
  }),
  unitInherited: (headings: string[], unit: string): Note => ({
    code: 'force-unit-assumed',
    sentence: `${listed(headings)} names no unit; ${unit} was taken, as for the other force column.`,
  }),
  timeUnitAssumed: (unit: string, rateHz: number): Note => ({
    code: 'time-unit-assumed',
    sentence: `The time column names no unit; its steps make sense in ${unit} only (${Math.round(rateHz)} Hz).`,
  }),
  rateFromHint: (rateHz: number): Note => ({
    code: 'rate-from-hint',
    sentence: `The file has no time column; the stated rate of ${rateHz} Hz was taken.`,
  }),
  linesBeforeHeader: (count: number): Note => ({
    code: 'lines-before-header',
    sentence: `${count} ${count === 1 ? 'line' : 'lines'} above the column headings ${count === 1 ? 'was' : 'were'} not used.`,
  }),
  linesLeftOut: (count: number, first: string): Note => ({
    code: 'lines-left-out',
    sentence: `${count} ${count === 1 ? 'line' : 'lines'} after the last numbers ${count === 1 ? 'was' : 'were'} not used, beginning ${listed([first])}.`,
  }),
  samplesFilled: (count: number, of: number): Note => ({
    code: 'samples-filled',
    sentence: `${count} of ${of} samples were blank, unreadable or missing and were filled from their neighbours.`,
  }),
  endsTrimmed: (count: number): Note => ({
    code: 'ends-trimmed',
    sentence: `${count} ${count === 1 ? 'line' : 'lines'} at the start or end held no complete sample and ${count === 1 ? 'was' : 'were'} left off.`,
  }),
  coarseTime: (stepText: string): Note => ({
    code: 'coarse-time-stamps',
    sentence: `The time stamps are rounded to ${stepText}; the rate was taken from the whole length of the recording.`,
  }),
}
