import type { Case } from '../case.ts'
import { fixed, gives, rising, seconds, thousandths } from './text.ts'
import type { MadeCase } from './text.ts'

import { channels, counts, force, single, twoForces, made } from './two-plates.ts'

const oneForce = (
  name: string,
  heading: string,
  values: number[],
  decimals: number,
  expected: Case,
  preamble: string[] = [],
): MadeCase =>
  made(
    name,
    { preamble, head: [['Time (s)', heading]], columns: [seconds(12), fixed(values, decimals)] },
    expected,
  )
const scaled = (
  factor: number,
  decimals: number,
  newtons: number,
): { values: number[]; single: number[] } => {
  const values = rising(12).map((n) => Number((n / factor).toFixed(decimals)))
  return { values, single: values.map((value) => thousandths(value * newtons)) }
}
const kgf = scaled(9.80665, 3, 9.80665)
const lbf = scaled(4.4482216152605, 3, 0.45359237 * 9.80665)
const weights = scaled(784.532, 5, 80 * 9.80665)
const percent = scaled(7.84532, 3, (80 * 9.80665) / 100)
const kilo = scaled(1000, 5, 1000)

/** Units of force. */
export const units: MadeCase[] = [
  oneForce('kilonewtons', 'Force (kN)', kilo.values, 5, gives({ single: kilo.single }, 1000)),
  oneForce('kilogram-force', 'Force (kgf)', kgf.values, 3, gives({ single: kgf.single }, 1000)),
  oneForce(
    'kilograms',
    'Load [kg]',
    kgf.values,
    3,
    gives({ single: kgf.single }, 1000, ['mass-unit-as-force']),
  ),
  oneForce('pound-force', 'Force (lbf)', lbf.values, 3, gives({ single: lbf.single }, 1000)),
  oneForce(
    'pounds',
    'Force (lbs)',
    lbf.values,
    3,
    gives({ single: lbf.single }, 1000, ['mass-unit-as-force']),
  ),
  oneForce(
    'body-weights-and-the-mass-above',
    'Force (BW)',
    weights.values,
    5,
    gives({ single: weights.single }, 1000, ['metadata-read', 'from-body-weights']),
    ['Body mass: 80 kg'],
  ),
  oneForce('percent-of-body-weight-and-a-stated-mass', 'Force (%BW)', percent.values, 3, {
    hints: { bodyMassKg: 80 },
    ...gives({ single: percent.single }, 1000, ['from-body-weights']),
  }),
  oneForce('no-unit-anywhere', 'Force', rising(12), 2, {
    error: { code: 'unit-unknown', line: 1, column: 2, seen: 'Force' },
    proposal: { time: { index: 0, unit: 's' }, forces: [{ index: 1, channel: 'single' }] },
  }),
  oneForce(
    'volts',
    'Fz (V)',
    rising(12).map((n) => n / 100),
    4,
    { error: { code: 'unit-unknown', seen: 'Fz (V)' } },
  ),
]

const timed = (
  name: string,
  heading: string,
  stamps: string[],
  expected: Case,
  preamble: string[] = [],
): MadeCase =>
  made(name, { preamble, head: [[heading, 'Force (N)']], columns: [stamps, force], delimiter: ';' }, expected)
const range = (cell: (i: number) => string): string[] => Array.from({ length: 12 }, (_, i) => cell(i))

/** Time in every form. */
export const times: MadeCase[] = [
  timed(
    'milliseconds',
    'Time (ms)',
    range((i) => `${2 * i}`),
    gives(single, 500),
  ),
  timed(
    'microseconds',
    'Time (µs)',
    range((i) => `${1000 * i}`),
    gives(single, 1000, [], { time: { index: 0, unit: 'us' } }),
  ),
  timed(
    'minutes',
    'Time (min)',
    range((i) => (i / 6000).toFixed(8)),
    gives(single, 100, [], { time: { index: 0, unit: 'min' } }),
  ),
  timed(
    'sample-numbers-and-a-rate',
    'Sample',
    counts,
    gives(single, 1000, ['metadata-read', 'rate-from-file'], { time: { index: 0, unit: 'samples' } }),
    ['Rate: 1000 Hz'],
  ),
  timed('sample-numbers-and-a-stated-rate', 'Frame', counts, {
    hints: { sampleRateHz: 240 },
    ...gives(single, 240, ['rate-from-hint']),
  }),
  timed('sample-numbers-without-a-rate', 'Sample no.', counts, {
    error: { code: 'rate-unknown', column: 1 },
    proposal: { time: { index: 0, unit: 'samples' }, forces: [{ index: 1, channel: 'single' }] },
  }),
  timed(
    'sample-numbers-in-twos',
    'Sample',
    range((i) => `${2 * i}`),
    { error: { code: 'uneven-time', column: 1 } },
    ['Rate: 1000 Hz'],
  ),
  made(
    'frames-and-samples-within-them',
    {
      preamble: ['Frame rate: 100 Hz'],
      head: [['Frame', 'Sub Frame', 'Fz (N)']],
      columns: [range((i) => `${1 + Math.floor(i / 4)}`), range((i) => `${i % 4}`), force],
    },
    gives(single, 400, ['metadata-read', 'rate-from-file']),
  ),
  made(
    'frames-and-the-rate-of-samples',
    {
      preamble: ['Analog rate: 1000 Hz'],
      head: [['Frame', 'Sub Frame', 'Fz (N)']],
      columns: [range((i) => `${1 + Math.floor(i / 3)}`), range((i) => `${1 + (i % 3)}`), force],
    },
    gives(single, 1000, ['metadata-read', 'rate-from-file']),
  ),
  timed(
    'times-of-day',
    'Clock',
    range((i) => `10:32:15.${String(5 * i).padStart(3, '0')}`),
    gives(single, 200, ['time-unit-assumed'], { time: { index: 0, unit: 's' } }),
  ),
  timed(
    'times-of-day-with-their-unit',
    'Time (hh:mm:ss.fff)',
    range((i) => `10:32:15.${String(5 * i).padStart(3, '0')}`),
    gives(single, 200, [], { time: { index: 0, unit: 'clock' } }),
  ),
  timed(
    'past-midnight',
    'Time (hh:mm:ss.fff)',
    range((i) => (i < 6 ? `23:59:59.${94 + i}` : `00:00:00.0${i - 6}`)),
    gives(single, 100),
  ),
  timed(
    'dates-and-times',
    'Timestamp',
    range((i) => `2026-11-03T10:32:15.${String(10 * i).padStart(3, '0')}Z`),
    gives(single, 100, ['time-unit-assumed']),
  ),
  timed(
    'minutes-and-seconds',
    'Elapsed',
    range((i) => `00:07.${String(10 * i).padStart(3, '0')}`),
    gives(single, 100, ['time-unit-assumed']),
  ),
  timed(
    'milliseconds-since-1970',
    'Timestamp (ms)',
    range((i) => `${1_793_700_000_000 + 4 * i}`),
    gives(single, 250),
  ),
  made(
    'no-time-and-no-rate',
    { head: [['Left (N)', 'Right (N)']], columns: twoForces },
    {
      error: { code: 'rate-unknown' },
      proposal: {
        time: null,
        forces: [
          { index: 0, channel: 'left' },
          { index: 1, channel: 'right' },
        ],
      },
    },
  ),
  made('stated-rate-against-stamps', {}, { hints: { sampleRateHz: 500 }, ...gives(channels, 1000) }),
]
