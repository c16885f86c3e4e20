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
  recorderDelayU: {
    value: 0.00015,
    unit: 's, standard uncertainty',
    source: `${own}: a recorder delays a takeoff by some more than a steep first touch`,
    effect: 'Wider intervals of contact times and RSI',
  },
  smoothedDelayU: {
    value: 0.00045,
    unit: 's, standard uncertainty',
    source: `${own}: the same of a low-pass of 200 Hz, which delays a takeoff by a millisecond`,
    effect: 'The same, where the noise of the empty plates shows a low-pass',
  },
  smoothedRoughness: {
    value: 2,
    unit: 'second over first differences, mean squares',
    source: `${own}: white noise has 3`,
    effect: 'A low-pass is seen in more recordings',
  },
  touchRiseShare: {
    value: 0.15,
    unit: 'of the time from the crossing to touchRiseN beyond touchQuickS, standard uncertainty',
    source: `${own}: ringing of the plate that the fit takes for the rise, a heel that comes a moment later`,
    effect: 'Wider intervals of touchdown, contact and flight times, more so where the force rises gently',
  },
  landingRiseShare: {
    value: 0.21,
    unit: 'of the same time, of the landing that ends a jump',
    source: `${own}: the feet come down one after the other, toe before heel`,
    effect: 'Wider intervals of touchdown and flight times',
  },
  touchQuickS: {
    value: 0.002,
    unit: 's',
    source: `${own}: a force that rises so quickly leaves no room for error`,
    effect: 'Narrower intervals of the same',
  },
  touchRiseN: {
    value: 200,
    unit: 'N',
    source: `${own}: more than a plate rings by`,
    effect: 'The same',
  },
  gravityU: {
    value: 0.0005,
    unit: 'm/s², standard uncertainty',
    source: `${own}: local anomalies of some 0.001 m/s² about the international formula`,
    effect: 'Wider U, same URepeat',
  },
  driftU: {
    value: 0.07,
    unit: 'N/s, standard uncertainty of each plate',
    source: `${own}: residual drift of a plate that has warmed up`,
    effect: 'Wider intervals of weight and velocity',
  },
} as const satisfies Record<string, SettingDefinition>
