/** The metrics that a sheet's cell and an athlete's page carry; everything else is on the trial. */
export const sheetMetrics = [
  'jumpHeightImpulse',
  'takeoffVelocity',
  'bodyMass',
  'timeToTakeoff',
  'rsiModified',
  'landingPeakForcePerBodyWeight',
  'landingLoadingRate2080PerBodyWeight',
] as const
