import { define, display, tests } from './define.ts'

const rsiSource =
  'Young 1995; Flanagan, Comyns 2008, Strength Cond J 30(5):32–38 (from memory): height over contact time'

/** Falls from a box, and contacts between falling and flying. */
export const contactMetrics = define(tests.rebounded, {
  contactTime: {
    name: 'Contact time',
    unit: 's',
    display: display.millisecond,
    better: 'lower',
    group: 'contact',
    phase: null,
    source: 'Definition: first touch to takeoff, both where the force crosses 10 N',
    athleteSentence: 'How long your feet were on the ground between falling and jumping.',
  },
  dropVelocity: {
    name: 'Drop velocity',
    protocols: tests.dropped,
    unit: 'm/s',
    display: display.metrePerSecond,
    group: 'impulse',
    phase: 'arrival',
    source:
      'McMahon, Lake, Stratford, Comfort 2021, Biomechanics 1(2):178–189: by integration backwards (negative: downwards)',
    athleteSentence: 'How fast you were falling when you touched the ground (negative: downwards).',
    sameFactAs: 'landingVelocity',
    sameFactIn: tests.dropLanding,
  },
  effectiveDropHeight: {
    name: 'Effective drop height',
    protocols: tests.dropped,
    unit: 'm',
    display: display.centimetre,
    group: 'impulse',
    phase: 'arrival',
    source:
      'McMahon, Lake, Stratford, Comfort 2021, Biomechanics 1(2):178–189: v²/2g of the drop velocity; often not the height of the box',
    athleteSentence: 'From how high you truly fell: stepping down or jumping off the box changes it.',
    sameFactAs: 'dropVelocity',
  },
  rsi: {
    name: 'RSI',
    unit: 'm/s',
    display: display.metrePerSecondShort,
    better: 'higher',
    group: 'contact',
    phase: null,
    source: `${rsiSource}, height from time in the air`,
    athleteSentence: 'Height for the time you took on the ground: high and quick at once.',
  },
  rsiFlightContact: {
    name: 'Flight time to contact time',
    unit: '',
    display: display.ratio,
    better: 'higher',
    group: 'contact',
    phase: null,
    source: 'Common practice: flight time over contact time, also called RSI; a ratio without unit',
    athleteSentence: 'Time in the air for each second on the ground.',
  },
  hopCount: {
    name: 'Hops',
    protocols: tests.hopped,
    unit: '',
    display: display.count,
    group: 'contact',
    phase: null,
    source: 'Definition: contacts between two flights; the jump that starts the series is none',
    athleteSentence: 'How many times you hopped.',
  },
  rsiBestFive: {
    name: 'RSI of the best five hops',
    protocols: tests.hopped,
    unit: 'm/s',
    display: display.metrePerSecondShort,
    better: 'higher',
    group: 'contact',
    phase: null,
    source:
      'Harper, Hobbs, Moore 2011: mean of the best five of ten hops; contacts over 250 ms left out (that limit from memory)',
    athleteSentence: 'Height for the time on the ground, the mean of your five best hops.',
  },
  contactTimeMean: {
    name: 'Mean contact time',
    protocols: tests.hopped,
    unit: 's',
    display: display.millisecond,
    better: 'lower',
    group: 'contact',
    phase: null,
    source: 'Definition: mean contact time of the hops that count among the first ten',
    athleteSentence: 'How long your feet were on the ground in each hop, on average.',
  },
})
