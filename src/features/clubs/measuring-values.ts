import type { MeasuringSettings } from '../../../shared/contracts/measuring.ts'
import {
  type ChangedSettings,
  type MethodChoice,
  methodChoiceKeys,
  methodChoices,
  type NumberChoice,
  numberChoiceKeys,
  onlyChanged,
  problemsOf,
  settingsWith,
} from '../../../shared/mechanics/settings/choices.ts'
import { checkSettings } from '../../../shared/mechanics/settings/checks.ts'
import { defaultSettings } from '../../../shared/mechanics/settings.ts'
import type { StaleField } from '../../components/stale-notice.tsx'
import { settingWords } from '../methods/setting-words.ts'

/** The form's values: every choice as it stands; an empty number is the engine's default. */
export interface MeasuringValues {
  numbers: Record<NumberChoice, number | null>
  methods: Record<MethodChoice, string>
}

export const methodNames: Record<MethodChoice, string> = {
  onsetRule: 'Onset of movement',
  asymmetryFormula: 'Asymmetry',
}

export function valuesOf({ changed }: MeasuringSettings): MeasuringValues {
  const settings = settingsWith(changed)
  const pick = (keys: readonly (NumberChoice | MethodChoice)[]) =>
    Object.fromEntries(keys.map((key) => [key, settings[key]]))
  return {
    numbers: pick(numberChoiceKeys) as MeasuringValues['numbers'],
    methods: pick(methodChoiceKeys) as MeasuringValues['methods'],
  }
}

export function changedOf({ numbers, methods }: MeasuringValues): ChangedSettings {
  const given = Object.entries(numbers).filter(([, value]) => value !== null)
  return onlyChanged({ ...Object.fromEntries(given), ...methods } as ChangedSettings)
}

/** What is wrong with the numbers, by setting; what is no number at all is said first. */
export const faultsOf = (values: MeasuringValues) => problemsOf(changedOf(values))

export const isChanged = (key: NumberChoice, value: number | null) =>
  value !== null && value !== defaultSettings[key]

const isCheck = (key: NumberChoice) => Object.hasOwn(checkSettings, key)
export const groups = [
  { title: 'How events and figures are read', keys: numberChoiceKeys.filter((key) => !isCheck(key)) },
  { title: 'Where a Trial check gives a caution or a fail', keys: numberChoiceKeys.filter(isCheck) },
]

export const measuringStaleFields: StaleField<MeasuringSettings>[] = [
  ...methodChoiceKeys.map((key) => ({
    label: methodNames[key],
    show: ({ changed }: MeasuringSettings) => methodChoices[key].options[settingsWith(changed)[key]],
  })),
  ...numberChoiceKeys.map((key) => ({
    label: settingWords(key),
    show: ({ changed }: MeasuringSettings) => String(settingsWith(changed)[key]),
  })),
]
