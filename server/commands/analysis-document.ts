import { createHash } from 'node:crypto'
import { basename } from 'node:path'
import { analyse } from '../../shared/mechanics/analyse.ts'
import { catalogue, isMetricKey } from '../../shared/mechanics/catalogue.ts'
import type { Settings } from '../../shared/mechanics/settings.ts'
import type {
  AnalyseOptions,
  AsymmetryFigure,
  Contact,
  Figure,
  Note,
  Recording,
  Test,
  TrialAnalysis,
} from '../../shared/mechanics/types.ts'
import type { ReadError } from '../../shared/recordings/errors.ts'
import { readRecording } from '../../shared/recordings/read-recording.ts'
import type { ColumnMap, FileFormat, ReadHints, ReadResult } from '../../shared/recordings/result.ts'
import { usualTest } from '../../shared/contracts/session-test.ts'
import { engineOptions, inputsOf } from '../modules/analyses/inputs.ts'

/** What the person at the command line says of the files. */
export interface GivenFacts {
  /** Without it the engine proposes the test. */
  test?: Test
  /** What is known of a test that is not named. */
  known?: AnalyseOptions['known']
  massKg?: number
  sampleRateHz?: number
  map?: ColumnMap
}

type WithUnit<F> = F & { unit: string }
type FileError = Omit<ReadError, 'code'> & { code: string }

type ContactEntry = { [Key in keyof Contact]: Contact[Key] extends Figure ? WithUnit<Figure> : Contact[Key] }

interface TrialEntry extends Omit<TrialAnalysis, 'test' | 'metrics' | 'sides' | 'ledger' | 'contacts'> {
  protocol: Test['protocol']
  test: Test
  contacts?: ContactEntry[]
  metrics: Record<string, WithUnit<Figure>>
  sides: {
    left: Record<string, WithUnit<Figure>>
    right: Record<string, WithUnit<Figure>>
    asymmetry: Record<string, WithUnit<AsymmetryFigure>>
  } | null
  ledger:
    | (Omit<NonNullable<TrialAnalysis['ledger']>, 'closing'> & {
        closing: WithUnit<NonNullable<TrialAnalysis['ledger']>['closing']>
      })
    | null
}

/** One file of the document that the command prints. */
export interface FileEntry {
  file: string
  sha256: string | null
  format: FileFormat | null
  columnMap: ColumnMap | null
  sampleRateHz: number | null
  durationS: number | null
  notes: Note[]
  error?: FileError
  trials: TrialEntry[]
}

const unitOf = (key: string): string => (isMetricKey(key) ? catalogue[key].unit : '')

function withUnits<F extends Figure>(
  figures: Record<string, F>,
  unit: (key: string) => string,
): Record<string, WithUnit<F>> {
  return Object.fromEntries(
    Object.entries(figures).map(([key, figure]) => [key, { ...figure, unit: unit(key) }]),
  )
}

function contactEntry(contact: Contact): ContactEntry {
  const { contactTime, flightTime, height, rsi, rsiFlightContact, peakForce } = contact
  return {
    ...contact,
    contactTime: { ...contactTime, unit: 's' },
    flightTime: { ...flightTime, unit: 's' },
    height: { ...height, unit: 'm' },
    rsi: { ...rsi, unit: 'm/s' },
    rsiFlightContact: { ...rsiFlightContact, unit: '' },
    peakForce: { ...peakForce, unit: 'N' },
  }
}

function trialEntry({ test, metrics, sides, ledger, contacts, ...rest }: TrialAnalysis): TrialEntry {
  return {
    protocol: test.protocol,
    test,
    ...rest,
    ...(contacts && { contacts: contacts.map(contactEntry) }),
    metrics: withUnits(metrics, unitOf),
    sides: sides && {
      left: withUnits(sides.left, unitOf),
      right: withUnits(sides.right, unitOf),
      asymmetry: withUnits(sides.asymmetry, () => '%'),
    },
    ledger: ledger && { ...ledger, closing: { ...ledger.closing, unit: 'N·s' } },
  }
}

/** A file that gave no recording. */
export function failedEntry(file: string, sha256: string | null, error: FileError): FileEntry {
  return {
    file,
    sha256,
    format: null,
    columnMap: null,
    sampleRateHz: null,
    durationS: null,
    notes: [],
    error,
    trials: [],
  }
}

/** What the server would have the engine analyse the recording with, where nothing is known of plates and place. */
function analysed(
  recording: Recording,
  { test, known, massKg }: GivenFacts,
  settings: Settings,
): ReturnType<typeof analyse> {
  const channels = Object.keys(recording.channels)
  const inputs = inputsOf({ test: test ?? usualTest('cmj'), recordedMassKg: massKg ?? null, channels })
  const { test: named, ...proposing } = engineOptions(inputs)
  return analyse(recording, test ? { ...proposing, test: named } : { ...proposing, known }, settings)
}

export const sha256Of = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex')

export const hintsOf = ({ sampleRateHz, massKg, map }: GivenFacts): ReadHints => ({
  ...(sampleRateHz === undefined ? {} : { sampleRateHz }),
  ...(massKg === undefined ? {} : { bodyMassKg: massKg }),
  ...(map === undefined ? {} : { map }),
})

/** Reads and analyses one file as the server does; `file` is named in the entry as it was given. */
export function fileEntry(file: string, bytes: Uint8Array, given: GivenFacts, settings: Settings): FileEntry {
  const read = readRecording(bytes, basename(file), hintsOf(given))
  return readingEntry({ file, sha256: sha256Of(bytes) }, read, given, settings)
}

/** Analyses what was read of a file. */
export function readingEntry(
  { file, sha256 }: Pick<FileEntry, 'file' | 'sha256'>,
  read: ReadResult,
  given: GivenFacts,
  settings: Settings,
): FileEntry {
  if (!read.ok) return failedEntry(file, sha256, read.error)
  const { recording, format, columnMap } = read
  const { notes, trials } = analysed(recording, given, settings)
  const samples = Object.values(recording.channels)[0]?.length ?? 0
  return {
    file,
    sha256,
    format,
    columnMap,
    sampleRateHz: recording.sampleRateHz,
    durationS: samples / recording.sampleRateHz,
    notes,
    trials: trials.map(trialEntry),
  }
}
