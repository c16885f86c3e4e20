import { own, type SettingDefinition } from './definition.ts'

/** What the uncertainty of every figure rests on. */
export const uncertaintySettings = {
  coverage: { value: 0.95, unit: 'probability', source: 'JCGM 100:2008', effect: 'Wider intervals' },
  swayVelocityChange: {
    value: 0.0015,
    unit: 'm/s, SD over the weighing window',
    source: `${own}: what a stance that looks calm may hide; what it shows is counted as noise`,
    effect: 'Wider intervals of weight, velocity and height',
  },
  swayFromMeansS: {
    value: 5,
    unit: 's',
    source: `${own}: stance from which sway is estimated by means of one window each`,
    effect: 'Sway is estimated in fewer recordings',
  },
  touchTimeU: {
    value: 0.0005,
    unit: 's, standard uncertainty',
    source: `${own}: a recorder's low-pass of 200 Hz delays the force by a millisecond, a steep rise by less`,
    effect: 'Wider intervals of touchdown, contact and flight times',
  },
  touchForceU: {
    value: 8,
    unit: 'N, standard uncertainty',
    source: `${own}: ringing of the plate at the touch that the fit takes for the rise`,
    effect: 'The same, more so where the force rises gently',
  },
  touchLongestU: {
    value: 0.0012,
    unit: 's, standard uncertainty',
    source: `${own}: ringing of 150 Hz has turned by then`,
    effect: 'The same, where the force rises most gently',
  },
  gravityU: {
    value: 0.0005,
    unit: 'm/s², standard uncertainty',
    source: `${own}: local anomalies of some 0.001 m/s² about the international formula`,
    effect: 'Wider U, same URepeat',
  },
  driftU: {
    value: 0.1,
    unit: 'N/s, standard uncertainty of each plate',
    source: `${own}: residual drift of a plate that has warmed up`,
    effect: 'Wider intervals of weight and velocity',
  },
} as const satisfies Record<string, SettingDefinition>
