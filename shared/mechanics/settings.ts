/** What stands beside a number that the method fixes. */
export interface SettingDefinition {
  value: number
  unit: string
  /** Published source, or "common practice", or "our own". */
  source: string
  /** What a larger value does. */
  effect: string
}

const own = 'our own'
const practice = 'common practice'
const owen = 'Owen et al. 2014, J Strength Cond Res 28(6):1552–1558'

/** Every threshold, window and constant of the engine. */
export const settingDefinitions = {
  eventForceN: {
    value: 10,
    unit: 'N',
    source:
      'Pérez-Castilla et al. 2021, Meas Phys Educ Exerc Sci 25(3):227–235 (one of the thresholds compared)',
    effect: 'Earlier takeoff, later touchdown, greater takeoff velocity: some 2 mm/s for each 10 N',
  },
  eventPersistenceS: {
    value: 0.1,
    unit: 's',
    source: own,
    effect: 'A longer time off the plate is asked of a flight',
  },
  unloadedSd: {
    value: 5,
    unit: 'SD of the unloaded plate',
    source: 'Pérez-Castilla et al. 2021 (five standard deviations of the flight force)',
    effect:
      'Flights are searched at a higher force on noisy plates; the events themselves stay at eventForceN',
  },
  longestFlightS: { value: 1.2, unit: 's', source: own, effect: 'Longer absences still count as flight' },
  shortestContactS: {
    value: 0.02,
    unit: 's',
    source: own,
    effect: 'A longer spell of ringing is passed over within a flight',
  },
  unloadedWindowS: {
    value: 0.1,
    unit: 's',
    source: `${own}: the shortest flight`,
    effect: 'Short flights are no longer recognised as unloaded',
  },
  flankLimitS: {
    value: 0.02,
    unit: 's',
    source: own,
    effect: 'More of the flank serves to place takeoff and touchdown',
  },
  flankNoise: {
    value: 15,
    unit: 'SD of the unloaded plate',
    source: `${own}: the flank is fitted up to eventForceN plus so much`,
    effect: 'Less noise and more bend in the placing of takeoff and touchdown',
  },
  flankMisfitSd: {
    value: 1.5,
    unit: 'SD of the unloaded plate',
    source: `${own}: what a flank's fit may leave over before a bend or ringing is looked for`,
    effect: 'More misfit is taken for noise',
  },
  flankThirdPower: {
    value: 0.2,
    unit: 'of the squared misfit',
    source: `${own}: below it the third power explains the flank, above it the plate rings`,
    effect: 'Ringing is more often taken for a bend',
  },
  flankRinging: {
    value: 1,
    unit: 'of the way that the flank takes to rise by the ringing',
    source: `${own}: ringing begins with the contact and does not average out`,
    effect: 'Wider intervals of times and landing figures on ringing plates',
  },
  flankStep: {
    value: 20,
    unit: 'event forces within one sample interval',
    source: `${own}: a leap that leaves no flank to fit`,
    effect: 'Fewer crossings are placed in the middle of an interval',
  },
  flightMarginS: {
    value: 0.03,
    unit: 's',
    source: `${practice}: 20 to 50 ms at both edges for ringing`,
    effect: 'Less of the flight serves to find zero and noise',
  },
  smallestLoadN: { value: 150, unit: 'N', source: own, effect: 'Lighter athletes are no longer recognised' },
  greatestForceN: {
    value: 50000,
    unit: 'N',
    source: `${own}: beyond any plate for people`,
    effect: 'Larger nonsense figures are taken for force',
  },
  weighingWindowS: {
    value: 1,
    unit: 's',
    source: owen,
    effect: 'Steadier weight, fewer recordings long enough',
  },
  shortestWeighingS: { value: 0.25, unit: 's', source: own, effect: 'More short recordings fail' },
  noiseBlockS: {
    value: 0.005,
    unit: 's',
    source: `${own}: block means before the autocorrelation`,
    effect: 'Faster and coarser count of independent samples',
  },
  noiseInflationKept: {
    value: 0.75,
    unit: 'of the inflation to the first ρ ≤ 0',
    source: `${own}: a heartbeat pays back in its second half what it added in its first`,
    effect: 'Wider intervals of weight and velocity where the stance swings',
  },
  onsetFraction: {
    value: 0.025,
    unit: 'of system weight',
    source: 'Meylan, Nosaka, Green, Cronin 2011, J Strength Cond Res 25(4):1164–1167',
    effect: 'Later onset, shorter time to takeoff',
  },
  onsetSd: {
    value: 5,
    unit: 'SD of the weighing',
    source: owen,
    effect: 'Later onset under the rule of standard deviations',
  },
  onsetLeadS: { value: 0.03, unit: 's', source: owen, effect: 'Earlier onset' },
  movementFraction: {
    value: 0.1,
    unit: 'of system weight',
    source: 'Meylan et al. 2011 (largest of the thresholds compared)',
    effect: 'A larger deviation is needed to count as movement',
  },
  quietPersistenceS: {
    value: 0.1,
    unit: 's',
    source: own,
    effect: 'Earlier onset where the start is hesitant',
  },
  movementGapS: {
    value: 0.25,
    unit: 's',
    source: own,
    effect: 'A longer pause still counts as part of the same movement',
  },
  onsetSmoothingS: {
    value: 0.02,
    unit: 's',
    source: `${own}: for finding only, the crossing is fitted to unfiltered force`,
    effect: 'Less noise and less detail where the onset is searched',
  },
  onsetFitShare: {
    value: 0.6,
    unit: 'of the way to the gross deviation',
    source: `${own}: as far as the flank keeps its shape`,
    effect: 'Less noise and more bend in the placing of the onset',
  },
  onsetFitLongestS: { value: 0.025, unit: 's', source: own, effect: 'The same, for slow movements' },
  onsetGentleStart: {
    value: 0.7,
    unit: 'of the mean slope to the gross deviation',
    source: `${own}: a start in proportion to t² has two thirds there; a steeper one may be noise`,
    effect: 'Narrower interval of the onset',
  },
  crossingRiseSd: {
    value: 6,
    unit: 'SD of the unloaded plate',
    source: `${own}: rise of force over the window in which its crossing of the weight is fitted`,
    effect: 'Less noise and more bend in the end of unweighting',
  },
  crossingShortestS: { value: 0.006, unit: 's', source: own, effect: 'The same, for steep crossings' },
  crossingLongestS: { value: 0.025, unit: 's', source: own, effect: 'The same, for gentle crossings' },
  peakFallSd: {
    value: 4,
    unit: 'SD of the unloaded plate',
    source: `${own}: fall of force from the peak to the ends of the window in which it is fitted`,
    effect: 'Less noise and more rounding of peaks',
  },
  peakWidestS: { value: 0.015, unit: 's', source: own, effect: 'The same, for flat peaks' },
  stillWindowS: {
    value: 1,
    unit: 's',
    source: own,
    effect: 'Longer quiet stance is asked for after landing',
  },
  stabilisationFraction: {
    value: 0.05,
    unit: 'of system weight',
    source: 'Flanagan, Ebben, Jensen 2008, J Strength Cond Res 22(5):1677–1682 (from memory)',
    effect: 'Shorter time to stabilisation',
  },
  landingSearchS: {
    value: 0.5,
    unit: 's',
    source: own,
    effect: 'The landing peak is searched longer where velocity does not come back to zero',
  },
  firstPeakProminence: {
    value: 0.2,
    unit: 'of body weight',
    source: own,
    effect: 'Fewer first peaks are named',
  },
  loadingRateLow: {
    value: 0.2,
    unit: 'of the peak',
    source: 'Milner et al. 2006 (from memory)',
    effect: 'Later start of the slope',
  },
  loadingRateHigh: {
    value: 0.8,
    unit: 'of the peak',
    source: 'Milner et al. 2006 (from memory)',
    effect: 'Later end of the slope',
  },
  loadingRateSamples: {
    value: 8,
    unit: 'samples',
    source: own,
    effect: 'More loading rates are given without uncertainty',
  },
  loadingRateWindowS: {
    value: 0.01,
    unit: 's',
    source: practice,
    effect: 'Lower greatest loading rate, less noise in it',
  },
  rateOfForceWindowS: { value: 0.05, unit: 's', source: practice, effect: 'Lower propulsion rate of force' },
  rateOfForceCutoffHz: {
    value: 50,
    unit: 'Hz',
    source: `${practice}: zero-lag Butterworth, cut-off corrected for two passes (Winter)`,
    effect: 'More noise and detail in the rates of force',
  },
  landingImpulseShortS: {
    value: 0.05,
    unit: 's',
    source: practice,
    effect: 'Larger landing impulse of the short window',
  },
  landingImpulseLongS: {
    value: 0.1,
    unit: 's',
    source: practice,
    effect: 'Larger landing impulse of the long window',
  },
  coverage: { value: 0.95, unit: 'probability', source: 'JCGM 100:2008', effect: 'Wider intervals' },
  swayVelocityChange: {
    value: 0.003,
    unit: 'm/s, SD over the weighing window',
    source: own,
    effect: 'Wider intervals of weight, velocity and height',
  },
  swayFromMeansS: {
    value: 5,
    unit: 's',
    source: `${own}: stance from which sway is estimated by means of one window each`,
    effect: 'Sway is estimated in fewer recordings',
  },
  gravityU: {
    value: 0.0005,
    unit: 'm/s², standard uncertainty',
    source: `${own}: local anomalies of some 0.001 m/s² about the international formula`,
    effect: 'Wider U, same URepeat',
  },
  driftU: {
    value: 0.08,
    unit: 'N/s, standard uncertainty',
    source: `${own}: residual drift of a plate that has warmed up`,
    effect: 'Wider intervals of weight and velocity',
  },
  lowestSampleRateHz: {
    value: 500,
    unit: 'Hz',
    source: 'Vanrenterghem et al. 2001 (from memory)',
    effect: 'More recordings get a caution',
  },
  poorestSampleRateHz: { value: 200, unit: 'Hz', source: own, effect: 'More recordings fail' },
  timeBaseLimit: {
    value: 0.1,
    unit: 'of a sample interval',
    source: own,
    effect: 'More uneven time bases pass',
  },
  filledLimit: { value: 0.005, unit: 'of the samples', source: own, effect: 'More gaps are allowed' },
  saturationSamples: { value: 4, unit: 'samples', source: own, effect: 'A longer flat top passes' },
  zeroOffsetCautionN: { value: 10, unit: 'N', source: own, effect: 'Larger zero offsets pass' },
  zeroOffsetFailN: {
    value: 50,
    unit: 'N',
    source: own,
    effect: 'Larger zero offsets are corrected without a fail',
  },
  steadinessCaution: {
    value: 0.015,
    unit: 'of system weight',
    source: own,
    effect: 'A less steady stance passes',
  },
  steadinessFail: {
    value: 0.04,
    unit: 'of system weight',
    source: own,
    effect: 'A less steady stance is kept',
  },
  onsetVelocityCaution: {
    value: 0.03,
    unit: 'm/s',
    source: own,
    effect: 'More movement before the jump passes',
  },
  onsetVelocityFail: {
    value: 0.06,
    unit: 'm/s',
    source: own,
    effect: 'More movement before the jump is kept',
  },
  massCaution: {
    value: 0.04,
    unit: 'of recorded mass',
    source: own,
    effect: 'A larger disagreement of mass passes',
  },
  massFail: {
    value: 0.1,
    unit: 'of recorded mass',
    source: own,
    effect: 'A larger disagreement of mass is kept',
  },
  footShareCaution: {
    value: 0.3,
    unit: 'of the weight',
    source: own,
    effect: 'A more uneven stance gets a caution',
  },
  footShareFail: { value: 0.1, unit: 'of the weight', source: own, effect: 'A lightly loaded plate fails' },
  heightAgreementM: {
    value: 0.04,
    unit: 'm',
    source: 'Baumgart et al. 2017 and Yamashita et al. 2020 (1.7 and 2.5 cm on average)',
    effect: 'A lower landing passes',
  },
  heightNegativeM: {
    value: 0.01,
    unit: 'm',
    source: own,
    effect: 'A flight height that far under the impulse height passes',
  },
  closingCaution: {
    value: 0.05,
    unit: 'm/s',
    source: practice,
    effect: 'A larger closing balance per kilogram passes',
  },
  closingFail: {
    value: 0.1,
    unit: 'm/s',
    source: practice,
    effect: 'A larger closing balance per kilogram is kept',
  },
  landingLengthS: {
    value: 1,
    unit: 's',
    source: own,
    effect: 'Longer recordings after touchdown are asked for',
  },
  footOffLandingS: { value: 0.05, unit: 's', source: own, effect: 'A foot may leave the plate for longer' },
  noiseCautionN: { value: 8, unit: 'N', source: own, effect: 'Noisier plates pass' },
  noiseFailN: { value: 30, unit: 'N', source: own, effect: 'Noisier plates are kept' },
  highestJumpM: {
    value: 1,
    unit: 'm',
    source: `${own}: beyond any standing jump`,
    effect: 'Stranger traces pass',
  },
  lowestJumpM: { value: 0.02, unit: 'm', source: own, effect: 'Smaller hops fail' },
} as const satisfies Record<string, SettingDefinition>

export type SettingKey = keyof typeof settingDefinitions

/** How the onset is found: a fraction of the weight, or standard deviations of the weighing. */
export type OnsetRule = 'fraction' | 'standard-deviations'

/** The numbers that an analysis was made with; stored with it. */
export type Settings = { version: number; onsetRule: OnsetRule } & Record<SettingKey, number>

const entries = Object.entries(settingDefinitions).map(([key, { value }]) => [key, value])

/** The engine's own settings. A changed default raises the version. */
export const defaultSettings: Readonly<Settings> = Object.freeze({
  version: 1,
  onsetRule: 'fraction',
  ...(Object.fromEntries(entries) as Record<SettingKey, number>),
})
