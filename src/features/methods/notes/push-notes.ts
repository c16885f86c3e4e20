import type { pushMetrics } from '../../../../shared/mechanics/catalogue/push.ts'
import type { EventName } from '../../../../shared/mechanics/types.ts'
import { begun, crossed, integrated, peaked, perKilogram, type MetricNote } from './note.ts'

const filtered: MetricNote['settings'] = ['rateOfForceCutoffHz']
const rateLimits =
  'Rates of force are the least repeatable of the usual figures: a coefficient of variation of some 13 % was published for 41 men. Filter and window change them.'

const time = (
  definition: string,
  [from, to]: [EventName, EventName],
  [a, b]: [string, string],
  settings: MetricNote['settings'],
): MetricNote => ({
  definition,
  formula: `\\Delta t = t_{\\text{${b}}} - t_{\\text{${a}}}`,
  symbols: 'the instants of the events that bound the phase',
  from: [],
  settings,
  evidence: 'definition',
  unchecked: 'The page of the paper was found; what it says of the phases is from memory.',
  limits:
    'Where force or velocity pass their level gently, the instant is less sure; the interval carries that.',
  read: `From ${a} to ${b}.`,
  events: [from, to],
})

const peakPower: MetricNote = {
  definition: 'The greatest product of force and velocity on the way up.',
  formula: 'P_{\\text{peak}} = \\max\\, F(t)\\, v(t)',
  symbols: 'F the force, v the velocity of the centre of mass, t within the propulsion phase',
  from: [],
  settings: [...integrated, ...peaked],
  evidence: 'published',
  limits:
    'Power of the centre of mass, not of the joints. Its correlation with jump height is partly an artefact, since both hold the velocity.',
  read: 'Within the propulsion phase, shortly before takeoff.',
  events: ['zeroVelocity', 'takeoff'],
}
const meanPower: MetricNote = {
  definition: 'The work of the push over the time of the propulsion phase.',
  formula: 'P_{\\text{mean}} = \\frac{A}{\\Delta t}',
  symbols: 'A propulsion work, Δt propulsion time',
  from: ['propulsionWork', 'propulsionTime'],
  settings: [...integrated, ...crossed],
  evidence: 'definition',
  limits: 'A shorter way up raises it at the same jump height.',
  read: 'Over the propulsion phase.',
  events: ['zeroVelocity', 'takeoff'],
}
const brakingPower: MetricNote = {
  ...peakPower,
  definition: 'The most negative product of force and velocity while the way down is stopped.',
  formula: 'P_{\\text{peak}} = \\min\\, F(t)\\, v(t)',
  symbols: 'F the force, v the velocity of the centre of mass, t within the braking phase',
  evidence: 'definition',
  limits: 'Power of the centre of mass, not of the joints; negative: energy is taken up.',
  read: 'Within the braking phase.',
  events: ['minimumVelocity', 'zeroVelocity'],
}

export const pushNotes: Record<keyof typeof pushMetrics, MetricNote> = {
  brakingRateOfForce: {
    definition: 'The mean slope of the low-pass filtered force over the braking phase.',
    formula:
      'R = \\frac{F_f(t_{\\text{lowest}}) - F_f(t_{\\text{fastest down}})}{t_{\\text{lowest}} - t_{\\text{fastest down}}}',
    symbols: 'F_f the force after a zero-lag Butterworth low-pass filter',
    from: ['brakingTime'],
    settings: [...filtered, ...integrated],
    evidence: 'practice',
    limits: rateLimits,
    read: 'The slope of the force over the braking phase.',
    events: ['minimumVelocity', 'zeroVelocity'],
  },
  propulsionRateOfForce: {
    definition:
      'The greatest slope of the low-pass filtered force over a sliding window of the propulsion phase.',
    formula: 'R = \\max \\frac{F_f(t + \\tau) - F_f(t)}{\\tau}',
    symbols: 'F_f the force after a zero-lag Butterworth low-pass filter, τ the window',
    from: [],
    settings: [...filtered, 'rateOfForceWindowS'],
    evidence: 'practice',
    limits: `${rateLimits} Where the force only falls on the way up, the greatest slope is negative or small.`,
    read: 'The steepest stretch of the force in the propulsion phase.',
    events: ['zeroVelocity', 'takeoff'],
  },
  unweightingTime: time(
    'The time from the onset until the downward velocity is greatest, where the force is back at the weight.',
    ['onset', 'minimumVelocity'],
    ['onset', 'fastest down'],
    begun,
  ),
  brakingTime: time(
    'The time from the greatest downward velocity to zero velocity.',
    ['minimumVelocity', 'zeroVelocity'],
    ['fastest down', 'lowest'],
    integrated,
  ),
  propulsionTime: time(
    'The time from zero velocity at the lowest point to takeoff.',
    ['zeroVelocity', 'takeoff'],
    ['lowest', 'takeoff'],
    [...integrated, ...crossed],
  ),
  peakVelocity: {
    definition: 'The greatest upward velocity before takeoff, where the force falls back to the weight.',
    formula: 'v_{\\text{peak}} = \\max v(t)',
    symbols: 'v the velocity of the centre of mass by integration from rest',
    from: [],
    settings: integrated,
    evidence: 'definition',
    limits: 'It lies above takeoff velocity: the feet leave the ground while the body already slows down.',
    read: 'Shortly before takeoff, at the top of the momentum trace.',
    events: ['zeroVelocity', 'takeoff'],
  },
  peakDownwardVelocity: {
    definition: 'The greatest downward velocity, where unweighting ends; negative.',
    formula: 'v_{\\text{min}} = \\min v(t)',
    symbols: 'v the velocity of the centre of mass by integration from rest',
    from: [],
    settings: integrated,
    evidence: 'definition',
    limits: 'Times system mass it is the unweighting impulse: it says nothing new beside it.',
    read: 'At the bottom of the momentum trace before the push.',
    events: ['onset', 'minimumVelocity'],
  },
  countermovementDepth: {
    definition: 'How far the centre of mass is below quiet stance at the lowest point; negative.',
    formula: 's = \\int_{t_{\\text{onset}}}^{t_{\\text{lowest}}} v\\, \\mathrm{d}t',
    symbols: 'v the velocity of the centre of mass by integration from rest',
    from: [],
    settings: integrated,
    evidence: 'definition',
    limits:
      'Double integration: some 4 mm for each newton of error of the weight. Not the depth of the hips.',
    read: 'At the lowest point, by double integration since the onset.',
    events: ['onset', 'zeroVelocity'],
  },
  legStiffness: {
    definition:
      'The rise of the force above the weight at the lowest point, over the way down since the greatest downward velocity.',
    formula: 'k = \\frac{F_0 - W_{\\text{sys}}}{s_{\\text{fastest down}} - s_{\\text{lowest}}}',
    symbols: 'F_0 force at zero velocity, W_sys system weight, s displacement',
    from: ['forceAtZeroVelocity', 'systemWeight'],
    settings: integrated,
    evidence: 'practice',
    limits: 'The legs are no spring. Several definitions are in use: compare only figures of one.',
    read: 'Over the braking phase.',
    events: ['minimumVelocity', 'zeroVelocity'],
  },
  peakPower,
  peakPowerPerKg: perKilogram('peakPower', peakPower),
  meanPropulsionPower: meanPower,
  meanPropulsionPowerPerKg: perKilogram('meanPropulsionPower', meanPower),
  peakBrakingPower: brakingPower,
  peakBrakingPowerPerKg: perKilogram('peakBrakingPower', brakingPower),
  propulsionWork: {
    definition: 'The work of the ground’s force on the centre of mass from the lowest point to takeoff.',
    formula: 'A = \\frac{1}{2} m v^2 + W_{\\text{sys}} (s_{\\text{takeoff}} - s_{\\text{lowest}})',
    symbols: 'm system mass, v takeoff velocity, W_sys system weight, s displacement',
    from: ['takeoffVelocity', 'systemWeight'],
    settings: [...integrated, ...crossed],
    evidence: 'definition',
    limits: 'Work on the centre of mass; what the limbs do about it is not in it.',
    read: 'Over the propulsion phase.',
    events: ['zeroVelocity', 'takeoff'],
  },
}
