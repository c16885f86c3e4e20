import type { MetricDefinition } from '../types.ts'

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
} as const satisfies Record<string, Display>

/** What an entry leaves to its folder: a plain metric of the countermovement jump. */
export type Entry = Omit<MetricDefinition, 'key' | 'protocols' | 'better'> & {
  better?: MetricDefinition['better']
}

/** Completes entries into definitions, each under its key. */
export function define<Key extends string>(entries: Record<Key, Entry>): Record<Key, MetricDefinition> {
  const complete = ([key, entry]: [string, Entry]) => [
    key,
    { better: null, ...entry, key, protocols: ['cmj'] },
  ]
  return Object.fromEntries((Object.entries(entries) as [string, Entry][]).map(complete)) as Record<
    Key,
    MetricDefinition
  >
}
