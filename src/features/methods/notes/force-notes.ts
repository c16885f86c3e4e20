import { forceKeys, type ForceKey, type forceMetrics } from '../../../../shared/mechanics/catalogue/force.ts'
import { integrated, peaked, perBodyWeight, type MetricNote } from './note.ts'

const greatest = (where: string, events: MetricNote['events']): MetricNote => ({
  definition: `The greatest force ${where}, unfiltered.`,
  formula: 'F_{\\text{peak}} = \\max F(t)',
  symbols: `F the force, t within the time ${where}`,
  from: [],
  settings: [...peaked, ...integrated],
  evidence: 'definition',
  limits:
    'The maximum of a noisy force lies above the true one: a curve fitted about the peak corrects it. Deep and quick jumps spread force differently over time, so a greater peak is not by itself a better push.',
  read: `The highest point of the force ${where}.`,
  events,
})

const mean = (phase: string, change: string, events: MetricNote['events']): MetricNote => ({
  definition: `The average force of the ${phase} phase: its gross impulse over its time.`,
  formula: 'F_{\\text{mean}} = W_{\\text{sys}} + \\frac{\\Delta p}{\\Delta t}',
  symbols: `W_sys system weight, Δp the change of momentum over the phase (${change}), Δt its time`,
  from: ['systemWeight'],
  settings: integrated,
  evidence: 'definition',
  limits: 'It rises when the phase gets shorter at the same change of momentum.',
  read: `The mean height of the force over the ${phase} phase.`,
  events,
})

const notes: Record<ForceKey, MetricNote> = {
  peakForce: greatest('between onset and takeoff', ['onset', 'takeoff']),
  minimumForce: {
    definition: 'The least force while the body lets itself drop, unfiltered.',
    formula: 'F_{\\text{min}} = \\min F(t)',
    symbols: 'F the force, t within the unweighting phase',
    from: [],
    settings: [...peaked, ...integrated],
    evidence: 'definition',
    limits: 'Near zero the athlete falls almost freely. A slow dip keeps it high without being worse.',
    read: 'The lowest point of the force in the unweighting phase.',
    events: ['onset', 'minimumForce', 'minimumVelocity'],
  },
  forceAtZeroVelocity: {
    definition: 'The force at the deepest point, where the way down ends and the way up begins.',
    formula: 'F_0 = F(t_{\\text{lowest}})',
    symbols: 't_lowest the instant of zero velocity',
    from: [],
    settings: integrated,
    evidence: 'definition',
    limits:
      'An error of the weight shifts the instant of zero velocity, and with it the force; the interval carries that.',
    read: 'The force at the lowest point.',
    events: ['zeroVelocity'],
  },
  peakBrakingForce: greatest('of the braking phase', ['minimumVelocity', 'zeroVelocity']),
  meanBrakingForce: mean('braking', 'system mass times greatest downward speed', [
    'minimumVelocity',
    'zeroVelocity',
  ]),
  peakPropulsionForce: greatest('of the propulsion phase', ['zeroVelocity', 'takeoff']),
  meanPropulsionForce: mean('propulsion', 'system mass times takeoff velocity', ['zeroVelocity', 'takeoff']),
}

const twins = Object.fromEntries(
  forceKeys.map((key) => [`${key}PerBodyWeight`, perBodyWeight(key, 'F', notes[key])]),
) as Record<`${ForceKey}PerBodyWeight`, MetricNote>

export const forceNotes: Record<keyof typeof forceMetrics, MetricNote> = { ...notes, ...twins }
