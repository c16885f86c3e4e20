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
  massAsForce: (headings: string[]): Note => ({
    code: 'mass-unit-as-force',
    sentence: `${listed(headings)} ${headings.length === 1 ? 'is' : 'are'} in a unit of mass, taken as its weight under standard gravity (9.80665 m/s²).`,
  }),
  fromBodyWeights: (massKg: number, stated: 'file' | 'hint'): Note => ({
    code: 'from-body-weights',
    sentence: `The forces are in body weights; they were turned into newtons with the mass of ${Number(massKg.toFixed(2))} kg that ${stated === 'file' ? 'the file states' : 'was stated'}.`,
  }),
  verticalByWeight: (headings: string[]): Note => ({
    code: 'vertical-by-weight',
    sentence: `${listed(headings)} ${headings.length === 1 ? 'was' : 'were'} taken as vertical, because the weight is on ${headings.length === 1 ? 'it' : 'them'} and not on the other components.`,
  }),
  totalNotAdded: (heading: string): Note => ({
    code: 'total-not-added',
    sentence: `${listed([heading])} is the sum of the others, and was not added to them.`,
  }),
  turnedOver: (channels: string[]): Note => ({
    code: 'force-turned-over',
    sentence: `Pressing down reads negative in this file, so the force was turned over (${channels.join(' and ')}).`,
  }),
  taredWithAthlete: (channels: string[]): Note => ({
    code: 'tared-with-athlete',
    sentence: `The plates read about nothing with the athlete on them (${channels.join(' and ')}); they were set to zero too late, and the analysis takes the zero from the flight.`,
  }),
  decimalCommaAssumed: (): Note => ({
    code: 'decimal-comma-assumed',
    sentence:
      'Each comma in the numbers stands before three figures; they were taken as decimals and not as thousands.',
  }),
  sentinelsLeftOut: (value: string, count: number): Note => ({
    code: 'sentinels-left-out',
    sentence: `${count} ${count === 1 ? 'cell holds' : 'cells hold'} ${value} far from ${count === 1 ? 'its' : 'their'} neighbours, a mark for a missing sample.`,
  }),
  lastLineCut: (): Note => ({
    code: 'last-line-cut',
    sentence: 'The last line is cut short and was left off.',
  }),
  timeUnitAssumed: (unit: string, rateHz: number): Note => ({
    code: 'time-unit-assumed',
    sentence: `The time column names no unit; its steps make sense in ${unit} only (${Math.round(rateHz)} Hz).`,
  }),
  rateFromHint: (rateHz: number): Note => ({
    code: 'rate-from-hint',
    sentence: `The file has no time column; the stated rate of ${rateHz} Hz was taken.`,
  }),
  rateFromMap: (rateHz: number): Note => ({
    code: 'rate-from-map',
    sentence: `The file states no rate; the ${rateHz} Hz of its column map were taken.`,
  }),
  rateFromFile: (rateHz: number): Note => ({
    code: 'rate-from-file',
    sentence: `The file has no time column; the ${rateHz} Hz that it states above its table were taken.`,
  }),
  rateDisagrees: (statedHz: number, rateHz: number): Note => ({
    code: 'rate-disagrees',
    sentence: `The file states ${statedHz} Hz above its table, and its time column says ${Number(rateHz.toFixed(1))} Hz; the time column was taken.`,
  }),
  linesRead: (count: number): Note => ({
    code: 'metadata-read',
    sentence: `${count} ${count === 1 ? 'line' : 'lines'} above the table ${count === 1 ? 'says' : 'say'} something of the recording.`,
  }),
  linesBeforeHeader: (count: number): Note => ({
    code: 'lines-before-header',
    sentence: `${count} ${count === 1 ? 'line' : 'lines'} above the table ${count === 1 ? 'was' : 'were'} not used.`,
  }),
  linesLeftOut: (count: number, first: string): Note => ({
    code: 'lines-left-out',
    sentence: `${count} ${count === 1 ? 'line' : 'lines'} after the last numbers ${count === 1 ? 'was' : 'were'} not used, beginning ${listed([first])}.`,
  }),
  samplesFilled: (count: number, of: number): Note => ({
    code: 'samples-filled',
    sentence: `${count} of ${of} samples were blank, unreadable or missing and were filled from their neighbours.`,
  }),
  stampsFilled: (count: number): Note => ({
    code: 'stamps-filled',
    sentence: `${count} time ${count === 1 ? 'stamp was' : 'stamps were'} blank or unreadable and ${count === 1 ? 'was' : 'were'} put in between ${count === 1 ? 'its' : 'their'} neighbours.`,
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
