import type { AsymmetryFormula } from '../statistics/asymmetry/formulas.ts'
import { checkSettings } from './settings/checks.ts'
import { contactSettings } from './settings/contacts.ts'
import { figureSettings } from './settings/figures.ts'
import { flightSettings } from './settings/flight.ts'
import { stanceSettings } from './settings/stance.ts'
import { trialSettings } from './settings/trials.ts'
import { uncertaintySettings } from './settings/uncertainty.ts'
import type { SettingDefinition } from './settings/definition.ts'

/** Every threshold, window and constant that a published or chosen method fixes. */
export const settingDefinitions = {
  ...flightSettings,
  ...trialSettings,
  ...stanceSettings,
  ...figureSettings,
  ...contactSettings,
  ...uncertaintySettings,
  ...checkSettings,
} as const satisfies Record<string, SettingDefinition>

export type SettingKey = keyof typeof settingDefinitions

/** How the onset is found: a fraction of the weight, or standard deviations of the weighing. */
export type OnsetRule = 'fraction' | 'standard-deviations'

/** The numbers that an analysis was made with; stored with it. */
export type Settings = {
  version: number
  onsetRule: OnsetRule
  asymmetryFormula: AsymmetryFormula
} & Record<SettingKey, number>

const entries = Object.entries(settingDefinitions).map(([key, { value }]) => [key, value])

/** The engine's own settings. A changed default raises the version. */
export const defaultSettings: Readonly<Settings> = Object.freeze({
  version: 1,
  onsetRule: 'fraction',
  asymmetryFormula: 'symmetryIndex',
  ...(Object.fromEntries(entries) as Record<SettingKey, number>),
})
