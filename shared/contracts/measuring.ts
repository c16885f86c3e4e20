import { z } from 'zod'
import type { AsymmetryFormula } from '../statistics/asymmetry/formulas.ts'
import {
  type ChangedSettings,
  methodChoices,
  type NumberChoice,
  numberChoiceKeys,
  problemsOf,
} from '../mechanics/settings/choices.ts'
import type { OnsetRule } from '../mechanics/settings.ts'
import { endpoint } from './endpoint.ts'
import { Moment, Version } from './fields.ts'
import { staffRoles } from './roles.ts'

/** What the club's analyses are made with. A change is a new edition; the analyses that are there stay as they are. */
const edition = {
  /** Number of the edition, from 1: what every club begins with. */
  version: Version,
  /** null of edition 1 */
  change: z.strictObject({ byName: z.string(), at: Moment }).nullable(),
}

const numbers = Object.fromEntries(
  numberChoiceKeys.map((key) => [key, z.number('Give a number').optional()]),
) as Record<NumberChoice, z.ZodOptional<z.ZodNumber>>

/** The settings that differ from the engine's, each within its bounds. */
export const Changed = z
  .strictObject({
    ...numbers,
    onsetRule: z.enum(Object.keys(methodChoices.onsetRule.options) as OnsetRule[]).optional(),
    asymmetryFormula: z
      .enum(Object.keys(methodChoices.asymmetryFormula.options) as AsymmetryFormula[])
      .optional(),
  })
  .superRefine((changed, issues) => {
    for (const [key, message] of Object.entries(problemsOf(changed as ChangedSettings)))
      issues.addIssue({ code: 'custom', path: [key], message })
  })

export const MeasuringSettings = z.strictObject({ changed: Changed, ...edition })
export type MeasuringSettings = z.infer<typeof MeasuringSettings>

export const getMeasuringSettings = endpoint({
  method: 'GET',
  path: '/api/club/measuring-settings',
  access: staffRoles,
  response: MeasuringSettings,
})
/** Puts these settings in the place of all that the club had changed; refused while a recompute runs. */
export const changeMeasuringSettings = endpoint({
  method: 'PUT',
  path: '/api/club/measuring-settings',
  access: ['admin', 'coach'],
  body: z.strictObject({ changed: Changed, version: Version }),
  response: MeasuringSettings,
})

/**
 * Expanded relative uncertainty (k = 2) of a plate's calibration where nothing is known of the plate: 0.5 %, as
 * makers commonly state (common practice).
 */
export const unknownPlateU = 0.005

/** Fractions: 0.05 to 5 % of the force. */
export const plateUBounds = { min: 0.0005, max: 0.05 } as const
const uSentence = 'Give 0.05 to 5 %'
const PlateU = z.number(uSentence).min(plateUBounds.min, uSentence).max(plateUBounds.max, uSentence)

const latitudeSentence = 'Give a latitude of −90 to 90 degrees'
/** Dead Sea shore to the highest towns. */
const altitudeSentence = 'Give an altitude of −450 to 6000 m'
export const GymPlace = z.strictObject({
  latitudeDeg: z.number(latitudeSentence).min(-90, latitudeSentence).max(90, latitudeSentence),
  altitudeM: z.number(altitudeSentence).min(-450, altitudeSentence).max(6000, altitudeSentence),
})

const calibration = {
  /** Expanded relative uncertainty (k = 2) by channel. */
  calibrationU: z.strictObject({ left: PlateU, right: PlateU, single: PlateU, total: PlateU }),
  /** Where the plates stand, for gravity; null where it is unknown. */
  place: GymPlace.nullable(),
}

export const PlateCalibration = z.strictObject({
  ...calibration,
  /** m/s², by the place; standard gravity without one. */
  gravity: z.number(),
  ...edition,
})
export type PlateCalibration = z.infer<typeof PlateCalibration>

export const getPlateCalibration = endpoint({
  method: 'GET',
  path: '/api/club/plate-calibration',
  access: staffRoles,
  response: PlateCalibration,
})
/** Refused while a recompute runs. */
export const changePlateCalibration = endpoint({
  method: 'PUT',
  path: '/api/club/plate-calibration',
  access: ['admin', 'coach'],
  body: z.strictObject({ ...calibration, version: Version }),
  response: PlateCalibration,
})
