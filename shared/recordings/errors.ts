import { MAX_FILE_BYTES, MAX_SAMPLES, MIN_SAMPLES } from './limits.ts'

/** Why a file could not be read. `sentence` says what was found, `remedy` what to do about it. */
export interface ReadError {
  code: ReadErrorCode
  sentence: string
  remedy: string
  /** Counted from 1. */
  line?: number
  /** Counted from 1. */
  column?: number
  /** The piece of the file that was met, made safe to show. */
  seen?: string
}

/** Where in the file, and what was met there. */
export type Place = Pick<ReadError, 'line' | 'column' | 'seen'>

const EXPORT_TEXT = 'Export the recording as delimited text with a heading over each column, and upload that.'
const MIB = 1024 * 1024

/** The one catalogue of reading errors: what is always true of a code, and what to do. */
const REMEDIES = {
  'empty-file': 'Export the recording again and check that the file has a size before uploading it.',
  'not-a-recording': EXPORT_TEXT,
  'too-large': `Split the recording: a file may have up to ${MAX_FILE_BYTES / MIB} MiB and ${MAX_SAMPLES.toLocaleString('en-GB')} samples.`,
  'unsupported-encoding': 'Save the file as UTF-8 text and upload it again.',
  'no-header': 'Put one line of headings above the numbers, for example: Time (s), Left (N), Right (N).',
  'no-force-column': 'Give the force column a heading that says so, with its unit, for example: Force (N).',
  'rate-unknown': 'Export with a time column, headed for example Time (s), or state the sampling rate.',
  'unit-unknown': 'Write the unit into the heading: N or kN for force, s or ms for time.',
  'ambiguous-columns':
    'Keep one force column for each foot, headed Left (N) and Right (N), or a single total.',
  'decimal-comma': 'Export with a decimal point instead of a decimal comma.',
  'uneven-time': 'Export the recording in one piece, at one sampling rate, with its original time stamps.',
  'corrupt-file': 'Export the recording again; if the line looks the same, the original is damaged there.',
  'too-few-samples': `Check that the export is complete: a recording needs at least ${MIN_SAMPLES} lines of numbers.`,
} as const

export type ReadErrorCode = keyof typeof REMEDIES

export const readErrorCodes = Object.keys(REMEDIES) as ReadErrorCode[]

/** A reading error with the remedy of its code. */
export function readError(code: ReadErrorCode, sentence: string, place: Place = {}): ReadError {
  return { code, sentence, remedy: REMEDIES[code], ...place }
}

/** Carries a reading error up to the front door, which returns it. */
export class ReadFault extends Error {
  readonly readError: ReadError

  constructor(code: ReadErrorCode, sentence: string, place: Place = {}) {
    super(sentence)
    this.name = 'ReadFault'
    this.readError = readError(code, sentence, place)
  }
}

/** For whoever knows the size before the bytes are there. */
export function tooLargeError(sizeBytes: number): ReadError {
  // Rounded up, so that a file just over the limit is never said to be of the limit's size.
  const size = Math.ceil((sizeBytes / MIB) * 10) / 10
  return readError(
    'too-large',
    `The file has ${size} MiB, and ${MAX_FILE_BYTES / MIB} MiB is the most that is read.`,
  )
}
