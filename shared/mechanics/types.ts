/**
 * The engine's contract: what it takes and what it returns. Types only.
 *
 * Units are SI and stand in the name where they are not obvious. Upward is positive for the force on the
 * athlete, for velocity and for displacement.
 */

/** Vertical force of one plate (or of all plates added up) in newtons, one value a sample. */
export type ForceChannel = 'left' | 'right' | 'single' | 'total'

/** Something assumed, corrected or left out, as a stable kebab-case code and a sentence for a coach. */
export interface Note {
  code: string
  sentence: string
}

/**
 * One reading of the plates on an even time base. Either `left` and `right`, or one of `single` and `total`.
 * `total` counts as one plate with one calibration: it has no sides.
 */
export interface Recording {
  sampleRateHz: number
  channels: Partial<Record<ForceChannel, Float64Array>>
  /** Samples that the file left blank or unreadable and the reader filled by interpolation. */
  filledSamples: number
  /** Greatest distance of a time stamp from the even time base, as a fraction of one sample interval. */
  timeBaseError: number
  notes: Note[]
}

/** Countermovement, squat and drop jump, countermovement jump on one leg, landing from a box, repeated hops. */
export type Protocol = 'cmj' | 'sj' | 'dj' | 'slcmj' | 'dropLanding' | 'hops'
export type Side = 'both' | 'left' | 'right'
export type Arms = 'hips' | 'free'

/** What was tested: the protocol and what makes two results comparable. */
export interface Test {
  protocol: Protocol
  side: Side
  externalLoadKg: number
  boxHeightM: number | null
  arms: Arms
}

export type EventName =
  | 'onset'
  | 'arrival'
  | 'minimumForce'
  | 'minimumVelocity'
  | 'zeroVelocity'
  | 'takeoff'
  | 'touchdown'
  | 'landingPeak'
  | 'landingZeroVelocity'
  | 'still'

/** An instant, between samples where it was fitted. `sample` is the nearest whole sample. */
export interface EventTime {
  timeS: number
  sample: number
}

export type Phase =
  'arrival' | 'unweighting' | 'braking' | 'propulsion' | 'contact' | 'flight' | 'landing' | 'settling'

/** Metric groups: what a Trial check can take away. */
export type MetricGroup =
  'weighing' | 'jump' | 'impulse' | 'push' | 'contact' | 'flight' | 'landing' | 'sides' | 'ledger'

/**
 * A figure with its expanded uncertainty for about 95 % (k · standard uncertainty, Student's t at the
 * Welch–Satterthwaite degrees of freedom). `URepeat` leaves out what is the same every time (plate
 * calibration, gravity). `null` only where the Method note says why.
 */
export interface Figure {
  value: number
  U: number | null
  k: number
  URepeat: number | null
  kRepeat: number
}

export interface AsymmetryFigure extends Figure {
  larger: 'left' | 'right'
  zeroWithin: boolean | null
}

export interface LedgerEntry {
  phase: Phase
  startS: number
  endS: number
  /** N·s */
  netImpulse: number
  /** m/s */
  deltaVelocity: number
  /** Running balance after this entry, N·s. */
  balance: number
}

export interface Ledger {
  entries: LedgerEntry[]
  /** `closes` is null where the closing balance cannot be tested (no quiet stance after landing). */
  closing: { value: number; U: number | null; closes: boolean | null }
}

export type Verdict = 'pass' | 'caution' | 'fail'

export interface TrialCheck {
  key: string
  verdict: Verdict
  affects: MetricGroup[]
  /** null where nothing could be measured */
  measured: number | null
  limit: number | null
  unit: string
  sentence: string
  remedy: string
}

export interface Sides {
  left: Record<string, Figure>
  right: Record<string, Figure>
  asymmetry: Record<string, AsymmetryFigure>
}

/** One contact between two flights, or between a drop and a flight. */
export interface Contact {
  touchdownS: number
  takeoffS: number
  /** s */
  contactTime: Figure
  /** Of the flight that follows, s. */
  flightTime: Figure
  /** g·t²/8 of the flight that follows, m. */
  height: Figure
  /** Height over contact time, m/s. */
  rsi: Figure
  /** Flight time over contact time. */
  rsiFlightContact: Figure
  /** N */
  peakForce: Figure
  /** Whether the published rule takes it into the score. */
  counted: boolean
}

/** Everything the engine says of one trial. Times are seconds from the recording's first sample. */
export interface TrialAnalysis {
  test: Test
  startS: number
  endS: number
  events: Partial<Record<EventName, EventTime>>
  /** Of a drop jump or of hops; absent where the test has none. */
  contacts?: Contact[]
  /** By metric key of the catalogue, in the catalogue's SI unit. */
  metrics: Record<string, Figure>
  /** null with one plate */
  sides: Sides | null
  /** null where no jump was found */
  ledger: Ledger | null
  checks: TrialCheck[]
  missing: { key: string; reason: string }[]
  notes: Note[]
}

export interface AnalyseOptions {
  /** Without it the engine proposes the test and says so in a note. */
  test?: Test
  /** What is known of a test that is not named. */
  known?: Partial<Omit<Test, 'protocol'>>
  /** The athlete's recorded body mass without load, kg. */
  recordedMassKg?: number
  /** m/s² at the plate's place; standard gravity where unknown. */
  gravity: number
  /** Expanded relative uncertainty (k = 2) of each plate's calibration, e.g. 0.005. */
  calibrationU: Partial<Record<ForceChannel, number>>
  /** Standard uncertainty of `gravity`, m/s²; the settings' value where not given. */
  gravityUncertainty?: number
  /** False leaves every uncertainty out (`null`), for speed; true where not given. */
  uncertainty?: boolean
  /** Events moved by a person, seconds from the first sample. */
  movedEvents?: Partial<Record<EventName, number>>
}

export interface RecordingAnalysis {
  engineVersion: string
  trials: TrialAnalysis[]
  notes: Note[]
}

/** What the catalogue says of a metric; screens, exports and Method notes read it, and nothing else names one. */
export interface MetricDefinition {
  key: string
  /** As a coach reads it, e.g. "Jump height". */
  name: string
  /** SI unit of the stored value, '' for a ratio. */
  unit: string
  /** How a screen shows it: value · factor, in this unit, with this many decimals. */
  display: { unit: string; factor: number; decimals: number }
  better: 'higher' | 'lower' | null
  group: MetricGroup
  phase: Phase | null
  protocols: readonly Protocol[]
  /** Published source of the method, or "common practice" or "definition". */
  source: string
  /** One sentence that an athlete understands. */
  athleteSentence: string
  /** Whether the figure is also given for each foot, or only so; absent: of both feet together. */
  feet?: 'also' | 'only'
  /** The metric of which this one is the same fact (an identity), so that no statistic counts it twice. */
  sameFactAs?: string
  /** The tests in which it is so; in all of its own where not given. */
  sameFactIn?: readonly Protocol[]
}
