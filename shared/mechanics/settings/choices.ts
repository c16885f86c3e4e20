import type { AsymmetryFormula } from '../../statistics/asymmetry/formulas.ts'
import {
  defaultSettings,
  type OnsetRule,
  settingDefinitions,
  type SettingKey,
  type Settings,
} from '../settings.ts'
import { owen } from './definition.ts'

interface Bounds {
  min: number
  max: number
}

/**
 * The numbers that are a matter of choice, each with the bounds within which the engine stays sane (our own). The
 * others belong to the method: the coverage of its intervals was proved with them as they are.
 */
export const numberChoices = {
  eventForceN: { min: 5, max: 50 },
  weighingWindowS: { min: 0.5, max: 2 },
  onsetFraction: { min: 0.01, max: 0.05 },
  onsetSd: { min: 3, max: 10 },
  onsetLeadS: { min: 0, max: 0.05 },
  movementFraction: { min: 0.06, max: 0.2 },
  stillWindowS: { min: 0.5, max: 2 },
  stabilisationFraction: { min: 0.02, max: 0.1 },
  firstPeakProminence: { min: 0.05, max: 0.5 },
  loadingRateLow: { min: 0.05, max: 0.4 },
  loadingRateHigh: { min: 0.6, max: 0.95 },
  loadingRateWindowS: { min: 0.005, max: 0.02 },
  rateOfForceWindowS: { min: 0.02, max: 0.1 },
  rateOfForceCutoffHz: { min: 15, max: 80 },
  landingImpulseShortS: { min: 0.02, max: 0.08 },
  landingImpulseLongS: { min: 0.09, max: 0.3 },
  lowestSampleRateHz: { min: 200, max: 2000 },
  poorestSampleRateHz: { min: 100, max: 1000 },
  filledLimit: { min: 0, max: 0.05 },
  zeroOffsetCautionN: { min: 1, max: 50 },
  zeroOffsetFailN: { min: 5, max: 200 },
  steadinessCaution: { min: 0.005, max: 0.05 },
  steadinessFail: { min: 0.01, max: 0.1 },
  onsetVelocityCaution: { min: 0.01, max: 0.1 },
  onsetVelocityFail: { min: 0.02, max: 0.2 },
  massCaution: { min: 0.01, max: 0.2 },
  massFail: { min: 0.02, max: 0.4 },
  footShareFail: { min: 0.02, max: 0.3 },
  footShareCaution: { min: 0.1, max: 0.45 },
  heightAgreementM: { min: 0.01, max: 0.1 },
  heightAgreementFailM: { min: 0.03, max: 0.3 },
  heightNegativeM: { min: 0.005, max: 0.05 },
  heightNegativeFailM: { min: 0.01, max: 0.1 },
  closingCaution: { min: 0.02, max: 0.2 },
  closingFail: { min: 0.04, max: 0.4 },
  landingLengthS: { min: 0.3, max: 3 },
  noiseCautionN: { min: 1, max: 30 },
  noiseFailN: { min: 4, max: 100 },
} as const satisfies Partial<Record<SettingKey, Bounds>>

export type NumberChoice = keyof typeof numberChoices
export const numberChoiceKeys = Object.keys(numberChoices) as NumberChoice[]

/** Settings that choose between methods. */
export type MethodChoice = 'onsetRule' | 'asymmetryFormula'

interface MethodChoiceDefinition {
  source: string
  effect: string
  /** By the setting's value, in words. */
  options: Readonly<Record<string, string>>
}

/** Choices between methods, with a sentence for each and where they come from. */
export const methodChoices: Readonly<Record<MethodChoice, MethodChoiceDefinition>> = {
  onsetRule: {
    source: `fraction: ${settingDefinitions.onsetFraction.source}; standard deviations: ${owen}`,
    effect: 'What the force must leave for the movement to have begun',
    options: {
      fraction: 'a fraction of the weight',
      'standard-deviations': 'standard deviations of the weighing',
    },
  },
  asymmetryFormula: {
    source:
      'symmetry index: Robinson, Herzog, Nigg 1987; bilateral share: Bishop et al. 2016; difference of the stronger: Impellizzeri et al. 2007; symmetry angle: Zifchock et al. 2008 (from memory)',
    effect: 'The scale of every asymmetry; figures by two formulas are never comparable',
    options: {
      symmetryIndex: 'the difference over the mean of both sides',
      bilateralShare: 'the difference over the sum of both sides',
      percentageDifference: 'the difference over the stronger side',
      symmetryAngle: 'the angle of one side against the other, over a right angle',
      logRatio: 'the logarithm of the ratio',
    },
  },
}

export const methodChoiceKeys = Object.keys(methodChoices) as MethodChoice[]

/** What a club has changed; whatever is absent stands at the engine's default. */
export type ChangedSettings = Partial<Record<NumberChoice, number>> & {
  onsetRule?: OnsetRule
  asymmetryFormula?: AsymmetryFormula
}

/** The first of each pair must stay below the second. */
export const inOrder: readonly (readonly [NumberChoice, NumberChoice])[] = [
  ['onsetFraction', 'movementFraction'],
  ['poorestSampleRateHz', 'lowestSampleRateHz'],
  ['zeroOffsetCautionN', 'zeroOffsetFailN'],
  ['steadinessCaution', 'steadinessFail'],
  ['onsetVelocityCaution', 'onsetVelocityFail'],
  ['massCaution', 'massFail'],
  ['footShareFail', 'footShareCaution'],
  ['heightAgreementM', 'heightAgreementFailM'],
  ['heightNegativeM', 'heightNegativeFailM'],
  ['closingCaution', 'closingFail'],
  ['noiseCautionN', 'noiseFailN'],
]

/** Settings for the engine: its defaults with these in their place. */
export const settingsWith = (changed: ChangedSettings): Settings => ({ ...defaultSettings, ...changed })

/** Only what differs from the defaults, in one order, whatever was written down. */
export function onlyChanged(changed: ChangedSettings): ChangedSettings {
  const keys = [...numberChoiceKeys, ...methodChoiceKeys].sort()
  const kept = keys.filter((key) => changed[key] !== undefined && changed[key] !== defaultSettings[key])
  return Object.fromEntries(kept.map((key) => [key, changed[key]]))
}

/** Setting → what is wrong with it; empty where the engine can work with them. */
export function problemsOf(changed: ChangedSettings): Partial<Record<NumberChoice, string>> {
  const problems: Partial<Record<NumberChoice, string>> = {}
  for (const key of numberChoiceKeys) {
    const { min, max } = numberChoices[key]
    const value = changed[key]
    if (value !== undefined && !(value >= min && value <= max))
      problems[key] = `Give ${min} to ${max} ${settingDefinitions[key].unit}`
  }
  const settings = settingsWith(changed)
  for (const [lower, upper] of inOrder) {
    if (settings[lower] < settings[upper]) continue
    const [at, other] = changed[upper] === undefined ? [lower, upper] : [upper, lower]
    problems[at] ??= `Must stay ${at === lower ? 'below' : 'above'} ${settings[other]} of ${other}`
  }
  return problems
}
