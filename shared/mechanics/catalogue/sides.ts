import { define, display, tests } from './define.ts'

const gross =
  'Definition: gross impulse of one foot over the phase of the total; a foot has no weight of its own'

/** What needs two plates. */
export const sidesMetrics = define(tests.bothFeet, {
  stanceForce: {
    name: 'Force in quiet stance',
    protocols: tests.landedBothFeet,
    unit: 'N',
    display: display.newtonFine,
    group: 'sides',
    phase: null,
    source: 'Definition: mean force of one foot over the weighing',
    athleteSentence: 'How much of your weight this foot carried while you stood still.',
    feet: 'only',
  },
  unweightingGrossImpulse: {
    name: 'Gross impulse, unweighting',
    protocols: tests.counterBothFeet,
    unit: 'N·s',
    display: display.impulse,
    group: 'sides',
    phase: 'unweighting',
    source: gross,
    athleteSentence: 'The push of this foot while you let yourself drop.',
    feet: 'only',
  },
  brakingGrossImpulse: {
    name: 'Gross impulse, braking',
    protocols: tests.turnedBothFeet,
    unit: 'N·s',
    display: display.impulse,
    group: 'sides',
    phase: 'braking',
    source: gross,
    athleteSentence: 'The push of this foot while you stopped the drop.',
    feet: 'only',
  },
  propulsionGrossImpulse: {
    name: 'Gross impulse, propulsion',
    unit: 'N·s',
    display: display.impulse,
    group: 'sides',
    phase: 'propulsion',
    source: gross,
    athleteSentence: 'The push of this foot on the way up.',
    feet: 'only',
  },
  landingGrossImpulse: {
    name: 'Gross impulse, landing',
    protocols: tests.landedBothFeet,
    unit: 'N·s',
    display: display.impulse,
    group: 'sides',
    phase: 'landing',
    source: gross,
    athleteSentence: 'The push of this foot in the landing.',
    feet: 'only',
  },
  meanLandingForce: {
    name: 'Mean landing force',
    protocols: tests.landedBothFeet,
    unit: 'N',
    display: display.newton,
    group: 'sides',
    phase: 'landing',
    source: 'Definition: gross impulse of one foot from touchdown to zero velocity, over that time',
    athleteSentence: 'The average force of this foot in the landing.',
    feet: 'only',
  },
  feetTakeoffLag: {
    name: 'Lag of the feet at takeoff',
    unit: 's',
    display: display.millisecondFine,
    group: 'sides',
    phase: 'propulsion',
    source:
      'Definition: takeoff of the right foot less takeoff of the left, each at 10 N (positive: right later)',
    athleteSentence: 'How much later your right foot left the ground than your left (negative: earlier).',
  },
  feetTouchdownLag: {
    name: 'Lag of the feet at touchdown',
    protocols: tests.landedBothFeet,
    unit: 's',
    display: display.millisecondFine,
    group: 'sides',
    phase: 'landing',
    source:
      'Definition: touchdown of the right foot less touchdown of the left, each at 10 N (positive: right later)',
    athleteSentence: 'How much later your right foot touched down than your left (negative: earlier).',
  },
})
