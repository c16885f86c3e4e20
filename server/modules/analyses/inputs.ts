import { createHash } from 'node:crypto'
import { unknownPlateU } from '../../../shared/contracts/measuring.ts'
import type { MovedEvents } from '../../../shared/mechanics/events/event-order.ts'
import { defaultSettings, type Settings } from '../../../shared/mechanics/settings.ts'
import { settingsWith } from '../../../shared/mechanics/settings/choices.ts'
import type { AnalyseOptions, ForceChannel } from '../../../shared/mechanics/types.ts'
import { standardGravity } from '../../../shared/units/gravity.ts'
import type { MadeWith } from '../../db/schema/recomputes.ts'
import type { AnalysisInputs } from '../../db/schema/trials.ts'

/** What is taken where nothing is known of the plates and their place, and no setting is changed. */
export const nothingKnown: MadeWith = {
  settings: `default-${defaultSettings.version}`,
  gravity: standardGravity,
  calibrationU: {
    left: unknownPlateU,
    right: unknownPlateU,
    single: unknownPlateU,
    total: unknownPlateU,
  },
}

/** What an analysis is made from besides the samples. */
export interface TrialToAnalyse {
  test: AnalysisInputs['test']
  recordedMassKg: number | null
  channels: readonly string[]
  /** Events that a person moved; absent, null or empty: none. */
  movedEvents?: MovedEvents | null
}

export function inputsOf(
  { test, recordedMassKg, channels, movedEvents }: TrialToAnalyse,
  madeWith: MadeWith = nothingKnown,
): AnalysisInputs {
  return {
    test,
    recordedMassKg,
    ...madeWithOf(channels, madeWith),
    ...(movedEvents && Object.keys(movedEvents).length > 0 ? { movedEvents } : {}),
  }
}

/** The same trial's inputs with other settings, plates and place; its own facts stay as they were taken then. */
export function remadeWith(
  { test, recordedMassKg, movedEvents }: AnalysisInputs,
  channels: readonly string[],
  madeWith: MadeWith,
): AnalysisInputs {
  return inputsOf({ test, recordedMassKg, channels, movedEvents: movedEvents ?? null }, madeWith)
}

function madeWithOf(
  channels: readonly string[],
  { settings, changedSettings, gravity, calibrationU }: MadeWith,
) {
  return {
    gravity,
    calibrationU: Object.fromEntries(
      channels.map((channel) => [channel, calibrationU[channel as ForceChannel]]),
    ),
    settings,
    ...(changedSettings ? { changedSettings } : {}),
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

/** The settings that the engine works with. */
export const settingsOf = ({ changedSettings }: Pick<AnalysisInputs, 'changedSettings'>): Settings =>
  settingsWith(changedSettings ?? {})

/** The same value with its keys in one order, whatever order it was built or read back in. */
function sorted(value: unknown): unknown {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value
  return Object.fromEntries(
    Object.entries(value)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([key, inner]) => [key, sorted(inner)]),
  )
}
