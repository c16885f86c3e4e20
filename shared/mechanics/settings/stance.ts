import { own, owen, type SettingDefinition } from './definition.ts'

/** How the quiet stance is weighed, and how the onset of movement is found. */
export const stanceSettings = {
  weighingWindowS: {
    value: 1,
    unit: 's',
    source: owen,
    effect: 'Steadier weight, fewer recordings long enough',
  },
  shortestWeighingS: { value: 0.25, unit: 's', source: own, effect: 'More short recordings fail' },
  weighingShrink: {
    value: 0.72,
    unit: 'of the window before',
    source: `${own}: shorter windows are tried where no full one is steady`,
    effect: 'More lengths are tried',
  },
  weighingSteadier: {
    value: 0.5,
    unit: 'of the unrest of the longer window',
    source: `${own}: a shorter weighing must be plainly steadier`,
    effect: 'Shorter windows are taken more readily',
  },
  noiseBlockS: {
    value: 0.005,
    unit: 's',
    source: `${own}: block means before the autocorrelation`,
    effect: 'Faster and coarser count of independent samples',
  },
  noiseInflationKept: {
    value: 0.85,
    unit: 'of the inflation to the first ρ ≤ 0',
    source: `${own}: a heartbeat pays back in its second half what it added in its first`,
    effect: 'Wider intervals of weight and velocity where the stance swings',
  },
  restInflationKept: {
    value: 0.45,
    unit: 'of the same inflation, in the stance after a landing',
    source: `${own}: there the swing of the landing dies away and pays back more of what it added`,
    effect: 'The same, of drop jumps, drop landings and hops',
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
} as const satisfies Record<string, SettingDefinition>
