import { define, display } from './define.ts'

const theorem =
  'Definition: integral of force less system weight over the phase (impulse and momentum theorem)'

/** Net impulses: what the momentum account is made of. */
export const impulseMetrics = define({
  unweightingImpulse: {
    name: 'Unweighting impulse',
    unit: 'N·s',
    display: display.impulse,
    group: 'impulse',
    phase: 'unweighting',
    source: theorem,
    athleteSentence:
      'The downward push that gravity gave you while you let yourself drop (negative: downwards).',
  },
  brakingImpulse: {
    name: 'Braking impulse',
    unit: 'N·s',
    display: display.impulse,
    group: 'impulse',
    phase: 'braking',
    source: theorem,
    athleteSentence: 'The push that stopped your drop; it is as large as the unweighting impulse.',
    sameFactAs: 'unweightingImpulse',
  },
  propulsionImpulse: {
    name: 'Propulsion impulse',
    unit: 'N·s',
    display: display.impulse,
    better: 'higher',
    group: 'impulse',
    phase: 'propulsion',
    source: theorem,
    athleteSentence: 'The push that sent you upwards from the lowest point.',
    sameFactAs: 'netImpulse',
  },
  netImpulse: {
    name: 'Net impulse',
    unit: 'N·s',
    display: display.impulse,
    better: 'higher',
    group: 'impulse',
    phase: null,
    source: theorem,
    athleteSentence: 'All pushes from the start to takeoff added up: your mass times your takeoff speed.',
  },
  landingImpulse: {
    name: 'Landing impulse',
    unit: 'N·s',
    display: display.impulse,
    group: 'landing',
    phase: 'landing',
    source: theorem,
    athleteSentence: 'The push that stopped your fall: your mass times your speed at touchdown.',
    sameFactAs: 'landingVelocity',
  },
  landingImpulse50: {
    name: 'Landing impulse, first 50 ms',
    unit: 'N·s',
    display: display.impulse,
    group: 'landing',
    phase: 'landing',
    source: 'Common practice: gross impulse over a fixed window from touchdown (cf. J Sports Sci Med 6:126)',
    athleteSentence: 'How much push the ground gave you in the first 50 ms of the landing.',
  },
  landingImpulse100: {
    name: 'Landing impulse, first 100 ms',
    unit: 'N·s',
    display: display.impulse,
    group: 'landing',
    phase: 'landing',
    source: 'Common practice: gross impulse over a fixed window from touchdown (cf. J Sports Sci Med 6:126)',
    athleteSentence: 'How much push the ground gave you in the first 100 ms of the landing.',
  },
  closingBalance: {
    name: 'Closing balance',
    unit: 'N·s',
    display: display.impulse,
    group: 'ledger',
    phase: 'settling',
    source: 'Definition: net impulse from rest to rest; zero but for measurement error',
    athleteSentence:
      'What is left over when all pushes are added up; it should be nothing, and shows how good the measurement is.',
  },
})
