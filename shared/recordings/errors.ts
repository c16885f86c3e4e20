import { MAX_ARCHIVE_FILES, MAX_UNPACKED_BYTES } from './archive-limits.ts'
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
export const readErrorCatalogue = {
  'empty-file': {
    meaning: 'The file holds nothing, or blanks only.',
    remedy: 'Export the recording again and check that the file has a size before uploading it.',
  },
  'not-a-recording': {
    meaning: 'The file is a picture, a document or a text without numbers.',
    remedy: EXPORT_TEXT,
  },
  'too-large': {
    meaning: 'The file has more bytes or more samples than are read.',
    remedy: `Split the recording: a file may have up to ${MAX_FILE_BYTES / MIB} MiB and ${MAX_SAMPLES.toLocaleString('en-GB')} samples.`,
  },
  'no-header': {
    meaning: 'No headings say what the columns of numbers are.',
    remedy:
      'Settle the columns once for files of this kind, or put headings above the numbers, for example: Time (s), Left (N), Right (N).',
  },
  'no-force-column': {
    meaning: 'No heading names a vertical force.',
    remedy:
      'Settle the columns once for files of this kind, or head the force column with its unit, for example: Force (N).',
  },
  'rate-unknown': {
    meaning: 'The file has no time that can be read, and nothing states the sampling rate.',
    remedy: 'State the sampling rate, or export with a time column, headed for example Time (s).',
  },
  'unit-unknown': {
    meaning: 'A force column is in no unit of force, or names none.',
    remedy:
      'Settle the unit once for files of this kind, or write it into the heading: N, kN, kgf, lbf or BW.',
  },
  'body-weight-unknown': {
    meaning: 'The forces are in body weights, and nothing states the athlete’s mass.',
    remedy: 'State the athlete’s mass, or export the forces in newtons.',
  },
  'ambiguous-columns': {
    meaning: 'The headings leave open which force belongs to which foot.',
    remedy:
      'Settle the columns once for files of this kind, or keep one force column for each foot, headed Left (N) and Right (N).',
  },
  'map-mismatch': {
    meaning: 'The column map was made for a file with other columns.',
    remedy: 'Choose the map of these headings, or settle the columns of this file.',
  },
  'decimal-comma': {
    meaning: 'Commas stand both between the columns and before the decimals.',
    remedy: 'Export with a decimal point, or with semicolons between the columns.',
  },
  'uneven-time': {
    meaning: 'The time stamps lie on no even time base.',
    remedy: 'Export the recording in one piece, at one sampling rate, with its original time stamps.',
  },
  'corrupt-file': {
    meaning: 'Part of the numbers cannot be read.',
    remedy: 'Export the recording again; if the line looks the same, the original is damaged there.',
  },
  'unsupported-plate-type': {
    meaning: 'A C3D file names a force plate of a type that is not read.',
    remedy:
      'Export the recording as delimited text, with the force of each plate in newtons, and upload that.',
  },
  'unsafe-archive': {
    meaning: 'The archive is built in a way that packing recordings never gives, and was not opened.',
    remedy:
      'Pack the recordings themselves into a new zip archive, without links and other archives, or upload them unpacked.',
  },
  'archive-protected': {
    meaning: 'The archive asks for a password.',
    remedy: 'Pack the recordings into a zip archive without a password, or upload them unpacked.',
  },
  'archive-too-large': {
    meaning: 'The archive holds more files or more bytes than are unpacked.',
    remedy: `Upload the recordings in several archives: up to ${MAX_ARCHIVE_FILES} files, of up to ${MAX_FILE_BYTES / MIB} MiB each and ${MAX_UNPACKED_BYTES / MIB} MiB together.`,
  },
  'empty-archive': {
    meaning: 'The archive holds no file.',
    remedy: 'Pack the recordings into the archive and upload it again.',
  },
  'unsupported-packing': {
    meaning: 'A file of the archive is packed in a way that is not read.',
    remedy: 'Pack the file into an ordinary zip archive, or upload it unpacked.',
  },
  'too-few-samples': {
    meaning: 'The file holds too few lines of numbers.',
    remedy: `Check that the export is complete: a recording needs at least ${MIN_SAMPLES} lines of numbers.`,
  },
} as const satisfies Record<string, { meaning: string; remedy: string }>

export type ReadErrorCode = keyof typeof readErrorCatalogue

export const readErrorCodes = Object.keys(readErrorCatalogue) as ReadErrorCode[]

/** A reading error with the remedy of its code. */
export function readError(code: ReadErrorCode, sentence: string, place: Place = {}): ReadError {
  return { code, sentence, remedy: readErrorCatalogue[code].remedy, ...place }
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
