import type { MetricDefinition, Protocol } from '../types.ts'

type Display = MetricDefinition['display']

/** How screens show a quantity: the SI value times `factor`, in `unit`, with so many decimals. */
export const display = {
  newton: { unit: 'N', factor: 1, decimals: 0 },
  newtonFine: { unit: 'N', factor: 1, decimals: 1 },
  bodyWeights: { unit: 'BW', factor: 1, decimals: 2 },
  bodyWeightsPerSecond: { unit: 'BW/s', factor: 1, decimals: 1 },
  kilogram: { unit: 'kg', factor: 1, decimals: 1 },
  centimetre: { unit: 'cm', factor: 100, decimals: 1 },
  metrePerSecond: { unit: 'm/s', factor: 1, decimals: 3 },
  metrePerSecondShort: { unit: 'm/s', factor: 1, decimals: 2 },
  momentum: { unit: 'kg·m/s', factor: 1, decimals: 1 },
  impulse: { unit: 'N·s', factor: 1, decimals: 1 },
  second: { unit: 's', factor: 1, decimals: 3 },
  millisecond: { unit: 'ms', factor: 1000, decimals: 0 },
  millisecondFine: { unit: 'ms', factor: 1000, decimals: 1 },
  kilonewtonPerSecond: { unit: 'kN/s', factor: 0.001, decimals: 1 },
  kilonewtonPerMetre: { unit: 'kN/m', factor: 0.001, decimals: 1 },
  watt: { unit: 'W', factor: 1, decimals: 0 },
  wattPerKilogram: { unit: 'W/kg', factor: 1, decimals: 1 },
  joule: { unit: 'J', factor: 1, decimals: 0 },
  ratio: { unit: '', factor: 1, decimals: 2 },
  count: { unit: '', factor: 1, decimals: 0 },
} as const satisfies Record<string, Display>

/** The tests that metrics belong to, by what the tests have. */
export const tests = {
  /** A countermovement from stance. */
  counter: ['cmj', 'slcmj'],
  /** A push from rest. */
  fromStance: ['cmj', 'sj', 'slcmj'],
  /** A held squat and a push. */
  squat: ['sj'],
  /** A way down that is stopped, and a way up to takeoff. */
  turned: ['cmj', 'slcmj', 'dj'],
  /** A takeoff and a flight. */
  jumped: ['cmj', 'sj', 'slcmj', 'dj'],
  /** One contact between a fall and a flight. */
  rebounded: ['dj'],
  /** A fall from a box. */
  dropped: ['dj', 'dropLanding'],
  dropLanding: ['dropLanding'],
  /** Contacts between flights. */
  hopped: ['hops'],
  /** A landing after which the athlete stands. */
  landed: ['cmj', 'sj', 'slcmj', 'dj', 'dropLanding', 'hops'],
  /** Quiet stance to weigh in. */
  weighed: ['cmj', 'sj', 'slcmj', 'dj', 'dropLanding', 'hops'],
  /** Quiet stance before and after. */
  restToRest: ['cmj', 'sj', 'slcmj', 'hops'],
  /** A jump off two feet. */
  bothFeet: ['cmj', 'sj', 'dj'],
  /** A landing on two feet. */
  landedBothFeet: ['cmj', 'sj', 'dj', 'dropLanding', 'hops'],
  /** A countermovement on two feet. */
  counterBothFeet: ['cmj'],
  /** A way down that is stopped, on two feet. */
  turnedBothFeet: ['cmj', 'dj'],
} as const satisfies Record<string, readonly Protocol[]>

/** What an entry leaves to its folder: no direction is better, and the tests are those of the folder. */
export type Entry = Omit<MetricDefinition, 'key' | 'protocols' | 'better'> & {
  better?: MetricDefinition['better']
  protocols?: MetricDefinition['protocols']
}

/** Completes entries into definitions, each under its key, of the tests that most of them belong to. */
export function define<Key extends string>(
  protocols: MetricDefinition['protocols'],
  entries: Record<Key, Entry>,
): Record<Key, MetricDefinition> {
  const complete = ([key, entry]: [string, Entry]) => [key, { better: null, protocols, ...entry, key }]
  return Object.fromEntries((Object.entries(entries) as [string, Entry][]).map(complete)) as Record<
    Key,
    MetricDefinition
  >
}
