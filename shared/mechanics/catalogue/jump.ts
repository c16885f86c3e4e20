import { define, display } from './define.ts'

/** How high, how fast, how long. */
export const jumpMetrics = define({
  jumpHeightImpulse: {
    name: 'Jump height',
    unit: 'm',
    display: display.centimetre,
    better: 'higher',
    group: 'jump',
    phase: 'flight',
    source: 'Linthorne 2001, Am J Phys 69:1198–1204: v²/2g from takeoff velocity by impulse and momentum',
    athleteSentence: 'How far your body rose after your feet left the ground.',
    sameFactAs: 'takeoffVelocity',
  },
  jumpHeightFlight: {
    name: 'Jump height from time in the air',
    unit: 'm',
    display: display.centimetre,
    better: 'higher',
    group: 'flight',
    phase: 'flight',
    source:
      'Linthorne 2001, Am J Phys 69:1198–1204: g·t²/8; reads high when the landing is lower than the takeoff',
    athleteSentence:
      'Jump height worked out from how long you were in the air; bent legs at landing make it too large.',
    sameFactAs: 'flightTime',
  },
  jumpHeightTotal: {
    name: 'Rise above standing',
    unit: 'm',
    display: display.centimetre,
    better: 'higher',
    group: 'jump',
    phase: 'flight',
    source:
      'Moir 2008, Meas Phys Educ Exerc Sci 12:207–218: height from takeoff velocity plus the rise before takeoff',
    athleteSentence:
      'How far your body rose above where it was when you stood, going onto your toes included.',
  },
  takeoffVelocity: {
    name: 'Takeoff velocity',
    unit: 'm/s',
    display: display.metrePerSecond,
    better: 'higher',
    group: 'jump',
    phase: 'propulsion',
    source: 'Linthorne 2001, Am J Phys 69:1198–1204: net impulse over mass',
    athleteSentence: 'How fast you were moving upwards as your feet left the ground.',
  },
  takeoffMomentum: {
    name: 'Takeoff momentum',
    unit: 'kg·m/s',
    display: display.momentum,
    better: 'higher',
    group: 'jump',
    phase: 'propulsion',
    source:
      'McMahon, Lake, Ripley, Comfort 2020, J Appl Biomech 36:370–374: system mass times takeoff velocity',
    athleteSentence: 'Your takeoff speed times your mass: how hard you would be to stop.',
    sameFactAs: 'netImpulse',
  },
  flightTime: {
    name: 'Flight time',
    unit: 's',
    display: display.second,
    better: 'higher',
    group: 'flight',
    phase: 'flight',
    source: 'Definition: takeoff to touchdown, both where the force crosses 10 N',
    athleteSentence: 'How long you were in the air.',
  },
  timeToTakeoff: {
    name: 'Time to takeoff',
    unit: 's',
    display: display.second,
    better: 'lower',
    group: 'jump',
    phase: null,
    source:
      'Ebben, Petushek 2010, J Strength Cond Res 24:1983–1987 (from memory): onset of movement to takeoff',
    athleteSentence: 'How long you took from starting to move to leaving the ground.',
  },
  rsiModified: {
    name: 'RSImod',
    unit: 'm/s',
    display: display.metrePerSecondShort,
    better: 'higher',
    group: 'jump',
    phase: null,
    source:
      'Ebben, Petushek 2010, J Strength Cond Res 24:1983–1987 (from memory): jump height over time to takeoff',
    athleteSentence: 'Height for the time you took to get it: high and quick at once.',
  },
  flightPerTakeoffTime: {
    name: 'Flight time to time to takeoff',
    unit: '',
    display: display.ratio,
    better: 'higher',
    group: 'flight',
    phase: null,
    source: 'McMahon et al. 2018, Sports 6(3):81: flight time over time to takeoff',
    athleteSentence: 'Time in the air for each second of getting there.',
  },
})
