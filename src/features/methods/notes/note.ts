import type { MetricKey } from '../../../../shared/mechanics/catalogue.ts'
import type { SettingKey } from '../../../../shared/mechanics/settings.ts'
import type { EventName } from '../../../../shared/mechanics/types.ts'

/** How far the source of a method was looked into. */
export type Evidence = 'published' | 'memory' | 'practice' | 'definition'

/** What a Method note says of a metric beyond the catalogue. */
export interface MetricNote {
  definition: string
  /** TeX, without accents: they would need inline styles. */
  formula: string
  /** What the formula's letters mean. */
  symbols: string
  /** Figures that go into this one. */
  from: MetricKey[]
  settings: SettingKey[]
  evidence: Evidence
  /** What of the source could not be checked. */
  unchecked?: string
  limits: string
  /** Where the uncertainty is left out, and why. */
  withoutU?: string
  /** Where on the trace it is read; the phase is the catalogue's. */
  read: string
  events: EventName[]
}

/** What makes the weighing. */
export const weighed: SettingKey[] = [
  'weighingWindowS',
  'shortestWeighingS',
  'noiseInflationKept',
  'swayVelocityChange',
  'driftU',
]
/** What places the onset. */
export const begun: SettingKey[] = ['onsetFraction', 'onsetLeadS', 'movementFraction', 'quietPersistenceS']
/** What places takeoff and touchdown. */
export const crossed: SettingKey[] = ['eventForceN', 'eventPersistenceS', 'flankLimitS']
/** What a touch may be wrong by. */
export const touched: SettingKey[] = ['touchRiseShare', 'landingRiseShare', 'touchRiseN', 'touchQuickS']
/** What a velocity by integration from rest rests on. */
export const integrated: SettingKey[] = [...weighed, ...begun, 'gravityU']
/** What places a peak. */
export const peaked: SettingKey[] = ['peakFallSd', 'peakWidestS']

/** The note of the same figure per body weight. */
export function perBodyWeight(key: MetricKey, letter: string, note: MetricNote): MetricNote {
  return {
    ...note,
    definition: `${note.definition} Here as a multiple of body weight, without any external load.`,
    formula: `${letter}_{\\text{BW}} = \\frac{${letter}}{W}`,
    symbols: `${letter} the figure in its own unit, W body weight`,
    from: [key, 'bodyWeight'],
    settings: [...new Set([...note.settings, ...weighed])],
  }
}

/** The note of the same power per kilogram. */
export function perKilogram(key: MetricKey, note: MetricNote): MetricNote {
  return {
    ...note,
    definition: `${note.definition} Here for each kilogram of body mass, without any external load.`,
    formula: 'p = \\frac{P}{m}',
    symbols: 'P the power in watts, m body mass',
    from: [key, 'bodyMass'],
  }
}
