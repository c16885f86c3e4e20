import type { MetricDefinition, Phase } from '../types.ts'
import { define, display, tests, type Entry } from './define.ts'

interface ForceOfPush {
  name: string
  phase: Phase | null
  better?: MetricDefinition['better']
  source: string
  athleteSentence: string
  feet?: MetricDefinition['feet']
  protocols?: MetricDefinition['protocols']
  sameFactAs?: string
  sameFactIn?: MetricDefinition['protocols']
}

const forces = {
  peakForce: {
    name: 'Peak force',
    protocols: tests.jumped,
    phase: null,
    better: 'higher',
    source: 'Definition: greatest force between onset and takeoff, unfiltered',
    athleteSentence: 'The greatest force of your push.',
  },
  minimumForce: {
    name: 'Minimum force',
    phase: 'unweighting',
    source: 'Definition: least force of the unweighting phase',
    athleteSentence: 'The least force under your feet while you let yourself drop.',
  },
  forceAtZeroVelocity: {
    name: 'Force at zero velocity',
    protocols: tests.turned,
    phase: 'braking',
    better: 'higher',
    source: 'Definition: force at the deepest point',
    athleteSentence: 'The force at your lowest point, where the push upwards begins.',
  },
  peakBrakingForce: {
    name: 'Peak braking force',
    protocols: tests.turned,
    phase: 'braking',
    source: 'Definition: greatest force of the braking phase',
    athleteSentence: 'The greatest force while you stopped the drop.',
    feet: 'also',
  },
  meanBrakingForce: {
    name: 'Mean braking force',
    protocols: tests.turned,
    phase: 'braking',
    source: 'Definition: gross impulse of the braking phase over its time',
    athleteSentence: 'The average force while you stopped the drop.',
    feet: 'also',
  },
  peakPropulsionForce: {
    name: 'Peak propulsion force',
    protocols: tests.jumped,
    phase: 'propulsion',
    better: 'higher',
    source: 'Definition: greatest force of the propulsion phase',
    athleteSentence: 'The greatest force on the way up.',
    feet: 'also',
    sameFactAs: 'peakForce',
    sameFactIn: tests.squat,
  },
  meanPropulsionForce: {
    name: 'Mean propulsion force',
    protocols: tests.jumped,
    phase: 'propulsion',
    better: 'higher',
    source: 'Definition: gross impulse of the propulsion phase over its time',
    athleteSentence: 'The average force on the way up.',
    feet: 'also',
  },
} as const satisfies Record<string, ForceOfPush>

/** Keys of the forces of the push in newtons; each has a twin per body weight. */
export const forceKeys = Object.keys(forces) as ForceKey[]
export type ForceKey = keyof typeof forces

const inNewtons = (force: ForceOfPush): Entry => ({
  ...force,
  unit: 'N',
  display: display.newton,
  group: 'push',
})

const perBodyWeight = (force: ForceOfPush): Entry => ({
  name: `${force.name} per body weight`,
  protocols: force.protocols ?? tests.counter,
  phase: force.phase,
  better: force.better,
  unit: 'BW',
  display: display.bodyWeights,
  group: 'push',
  source: `${force.source}; over body weight without load`,
  athleteSentence: `${force.athleteSentence.slice(0, -1)}, as so many times your body weight.`,
})

const entries = Object.entries(forces) as [ForceKey, ForceOfPush][]

/** Forces of the push, in newtons and per body weight. */
export const forceMetrics = {
  ...define(
    tests.counter,
    Object.fromEntries(entries.map(([key, force]) => [key, inNewtons(force)])) as Record<ForceKey, Entry>,
  ),
  ...define(
    tests.counter,
    Object.fromEntries(
      entries.map(([key, force]) => [`${key}PerBodyWeight`, perBodyWeight(force)]),
    ) as Record<`${ForceKey}PerBodyWeight`, Entry>,
  ),
}
