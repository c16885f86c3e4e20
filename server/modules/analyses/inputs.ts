import { createHash } from 'node:crypto'
import type { MovedEvents } from '../../../shared/mechanics/events/event-order.ts'
import { defaultSettings } from '../../../shared/mechanics/settings.ts'
import type { AnalyseOptions, ForceChannel } from '../../../shared/mechanics/types.ts'
import { standardGravity } from '../../../shared/units/gravity.ts'
import type { AnalysisInputs } from '../../db/schema/trials.ts'

/**
 * Expanded relative uncertainty (k = 2) of a plate's calibration where nothing is known of the plate: 0.5 %, as
 * makers commonly state (common practice).
 */
const unknownPlateU = 0.005

/** What an analysis is made from besides the samples. */
export interface TrialToAnalyse {
  test: AnalysisInputs['test']
  recordedMassKg: number | null
  channels: readonly string[]
  /** Events that a person moved; absent, null or empty: none. */
  movedEvents?: MovedEvents | null
}

export function inputsOf({ test, recordedMassKg, channels, movedEvents }: TrialToAnalyse): AnalysisInputs {
  return {
    test,
    recordedMassKg,
    gravity: standardGravity,
    calibrationU: Object.fromEntries(channels.map((channel) => [channel, unknownPlateU])),
    settings: `default-${defaultSettings.version}`,
    ...(movedEvents && Object.keys(movedEvents).length > 0 ? { movedEvents } : {}),
  }
}

/** SHA-256 over the inputs and the stored samples: the same again is the same analysis. */
export function hashInputs(inputs: AnalysisInputs, samples: Uint8Array): Buffer {
  return createHash('sha256').update(inputsText(inputs)).update(samples).digest()
}

/** The inputs as one text, whatever order their keys were built or read back in. */
export const inputsText = (inputs: AnalysisInputs): string => JSON.stringify(sorted(inputs))

export function engineOptions(inputs: AnalysisInputs): AnalyseOptions {
  return {
    test: inputs.test as AnalyseOptions['test'],
    ...(inputs.recordedMassKg === null ? {} : { recordedMassKg: inputs.recordedMassKg }),
    gravity: inputs.gravity,
    calibrationU: inputs.calibrationU as Partial<Record<ForceChannel, number>>,
    ...(inputs.movedEvents ? { movedEvents: inputs.movedEvents } : {}),
  }
}

/** The same value with its keys in one order, whatever order it was built or read back in. */
function sorted(value: unknown): unknown {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value
  return Object.fromEntries(
    Object.entries(value)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([key, inner]) => [key, sorted(inner)]),
  )
}
