import { own, practice, type SettingDefinition } from './definition.ts'

/** How unloaded plates, takeoff and touchdown are found. */
export const flightSettings = {
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
  flankFootS: {
    value: 0.01,
    unit: 's',
    source: `${own}: as early before the threshold of the search a contact may begin`,
    effect: 'The foot of a flank is searched earlier',
  },
  flankOutsideS: {
    value: 0.012,
    unit: 's',
    source: `${own}: flight beside the flank that the fit holds at zero`,
    effect: 'More of the flight steadies the fit of a flank',
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
  stepOnS: {
    value: 0.1,
    unit: 's',
    source: `${own}: until both feet stand after stepping on`,
    effect: 'Quiet stance is looked for later',
  },
  zeroShare: {
    value: 0.15,
    unit: 'of the load',
    source: `${own}: a level that near zero is that of empty plates, or of plates set to zero with the athlete on them`,
    effect: 'Larger offsets are taken for zero without looking further',
  },
  negativeShare: {
    value: 0.1,
    unit: 'of the range of the force',
    source: `${own}: a usual level that far below zero is that of a plate whose sign is turned over`,
    effect: 'Fewer plates are turned over',
  },
  offsetShare: {
    value: 0.4,
    unit: 'of the load',
    source: `${own}: a large offset is believed only of a flat trace; the bottom of a slow squat lies higher still`,
    effect: 'Larger offsets of the plates are recognised',
  },
  offsetSpread: {
    value: 0.02,
    unit: 'of the load, SD',
    source: `${own}: empty plates are that flat`,
    effect: 'Noisier plates with a large offset are recognised',
  },
  smallestLoadN: { value: 150, unit: 'N', source: own, effect: 'Lighter athletes are no longer recognised' },
  greatestForceN: {
    value: 50000,
    unit: 'N',
    source: `${own}: beyond any plate for people`,
    effect: 'Larger nonsense figures are taken for force',
  },
} as const satisfies Record<string, SettingDefinition>
