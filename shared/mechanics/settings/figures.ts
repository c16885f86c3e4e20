import { own, practice, type SettingDefinition } from './definition.ts'

/** How crossings, peaks, rates of force and what follows the landing are read. */
export const figureSettings = {
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
  forceWindowS: {
    value: 0.006,
    unit: 's',
    source: `${own}: half the window in which the force at an instant is fitted`,
    effect: 'Less noise and more bend in the force at an instant',
  },
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
  filterMarginS: {
    value: 0.1,
    unit: 's',
    source: `${own}: some five time constants of the filter`,
    effect: 'The filter settles further outside the push',
  },
  filterHighestCutoff: {
    value: 0.45,
    unit: 'of the sample rate',
    source: `${own}: below half of it, beyond which a filter has no meaning`,
    effect: 'The filter keeps its cut-off at lower sample rates',
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
} as const satisfies Record<string, SettingDefinition>
