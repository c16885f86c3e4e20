import { z } from 'zod'
import { GymPlace, type PlateCalibration, plateUBounds } from '../../../shared/contracts/measuring.ts'
import type { StaleField } from '../../components/stale-notice.tsx'

export const channels = ['left', 'right', 'single', 'total'] as const
export const channelWords: Record<(typeof channels)[number], string> = {
  left: 'Left plate',
  right: 'Right plate',
  single: 'One plate under both feet',
  total: 'Total, where a file has no feet',
}

const percentSentence = `Give ${plateUBounds.min * 100} to ${plateUBounds.max * 100} %`
const Percent = z
  .number(percentSentence)
  .min(plateUBounds.min * 100, percentSentence)
  .max(plateUBounds.max * 100, percentSentence)

/** The form's values: percent, and a place that is whole or empty. */
export const PlatesValues = z
  .strictObject({
    percent: z.strictObject({ left: Percent, right: Percent, single: Percent, total: Percent }),
    latitudeDeg: GymPlace.shape.latitudeDeg.nullable(),
    altitudeM: GymPlace.shape.altitudeM.nullable(),
  })
  .superRefine(({ latitudeDeg, altitudeM }, issues) => {
    if ((latitudeDeg === null) === (altitudeM === null)) return
    const path = [latitudeDeg === null ? 'latitudeDeg' : 'altitudeM']
    issues.addIssue({ code: 'custom', path, message: 'Give both, or leave both empty' })
  })
export type PlatesValues = z.infer<typeof PlatesValues>

/** Fraction ↔ percent, without the last digits of a floating product. */
const toPercent = (fraction: number) => Number((fraction * 100).toPrecision(12))
const toFraction = (percent: number) => Number((percent / 100).toPrecision(12))

export function valuesOf({
  calibrationU: { left, right, single, total },
  place,
}: PlateCalibration): PlatesValues {
  return {
    percent: {
      left: toPercent(left),
      right: toPercent(right),
      single: toPercent(single),
      total: toPercent(total),
    },
    latitudeDeg: place?.latitudeDeg ?? null,
    altitudeM: place?.altitudeM ?? null,
  }
}

export function bodyOf({ percent: { left, right, single, total }, latitudeDeg, altitudeM }: PlatesValues) {
  return {
    calibrationU: {
      left: toFraction(left),
      right: toFraction(right),
      single: toFraction(single),
      total: toFraction(total),
    },
    place: latitudeDeg === null || altitudeM === null ? null : { latitudeDeg, altitudeM },
  }
}

export const platesStaleFields: StaleField<PlateCalibration>[] = [
  ...channels.map((channel) => ({
    label: channelWords[channel],
    show: ({ calibrationU }: PlateCalibration) => `${toPercent(calibrationU[channel])} %`,
  })),
  {
    label: 'Place',
    show: ({ place }) => (place ? `${place.latitudeDeg}°, ${place.altitudeM} m` : 'unknown'),
  },
]
