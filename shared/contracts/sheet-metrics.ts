import type { Protocol } from '../mechanics/types.ts'

const landing = ['landingPeakForcePerBodyWeight', 'landingLoadingRate2080PerBodyWeight'] as const
const jump = ['jumpHeightImpulse', 'rsiModified', ...landing, 'takeoffVelocity', 'timeToTakeoff'] as const

/**
 * The metrics of a test that sheets, means and an athlete's page carry; everything else is on the trial. The first is
 * the one that stands for the test, the first four are columns of a sheet.
 */
export const metricsOfTest = {
  cmj: jump,
  slcmj: jump,
  sj: [
    'jumpHeightImpulse',
    'peakPropulsionForcePerBodyWeight',
    ...landing,
    'takeoffVelocity',
    'timeToTakeoff',
  ],
  dj: [
    'rsi',
    'contactTime',
    'jumpHeightImpulse',
    'landingPeakForcePerBodyWeight',
    'effectiveDropHeight',
    landing[1],
  ],
  hops: ['rsiBestFive', 'contactTimeMean', 'hopCount', ...landing],
  dropLanding: [...landing, 'landingTime', 'timeToStabilisation', 'timeToLandingPeak', 'landingVelocity'],
} as const satisfies Record<Protocol, readonly [string, ...string[]]>

/** What an athlete weighed stands beside the figures of every test. */
export const massMetric = 'bodyMass'

export type SheetMetric = (typeof metricsOfTest)[Protocol][number] | typeof massMetric

/** All of them, each once. */
export const sheetMetrics: readonly SheetMetric[] = [
  ...new Set<SheetMetric>([...Object.values<readonly SheetMetric[]>(metricsOfTest).flat(), massMetric]),
]

/** The one metric that stands for a test where there is room for one. */
export const headlineOf = (protocol: Protocol): SheetMetric => metricsOfTest[protocol][0]
