import type { Case } from '../case.ts'
import { falling, fixed, gives, plainHead, rising, seconds, table, thousandths, twoPlates } from './text.ts'
import type { Layout, MadeCase } from './text.ts'

const { columns, channels } = twoPlates(12)
const counts = Array.from({ length: 12 }, (_, i) => `${i + 1}`)
const force = fixed(rising(12))
const single = { single: rising(12) }
const twoForces = columns.slice(1)

const made = (name: string, layout: Partial<Layout>, expected: Case): MadeCase => ({
  name,
  bytes: table({ head: [plainHead], columns, ...layout }),
  expected,
})
/** Forces alone, their rate above them. */
const untimed = (name: string, preamble: string[], expected: Case, delimiter = ','): MadeCase =>
  made(name, { preamble, delimiter, head: [['Left (N)', 'Right (N)']], columns: twoForces }, expected)
const ofRate = (rateHz: number, lines = 1): Case =>
  gives(channels, rateHz, ['metadata-read', 'rate-from-file'], { metadata: { sampleRateHz: rateHz, lines: [lines] } })

/** Lines above the table. */
const preambles: MadeCase[] = [
  untimed('rate-above-the-table', ['Sampling rate: 500 Hz'], ofRate(500)),
  untimed('rate-and-unit-in-cells', ['Abtastrate;1000;Hz'], ofRate(1000), ';'),
  untimed('rate-in-kilohertz', ['Sampling frequency = 1.2 kHz'], ofRate(1200)),
  untimed('rate-unit-in-brackets', ['# Sample rate (Hz), 2000'], ofRate(2000)),
  untimed('rate-with-a-decimal-comma', ['Frecuencia de muestreo: 1000,0 Hz'], ofRate(1000), ';'),
  untimed('rate-of-no-plate', ['Sampling rate: 2 Hz'], { error: { code: 'rate-unknown' }, proposal: { time: null, forces: [{ index: 0, channel: 'left' }, { index: 1, channel: 'right' }] } }),
  made(
    'all-that-is-recognised',
    {
      preamble: [
        'Athlete: Ada Invented',
        'Body mass: 81.5 kg',
        'Test: Countermovement jump',
        'Date: 2026-11-03 10:32:15',
        'Sampling rate: 1000 Hz',
        'Operator: nobody',
        '',
      ],
    },
    gives(channels, 1000, ['metadata-read', 'lines-before-header'], {
      metadata: { athlete: 'Ada Invented', bodyMassKg: 81.5, test: 'Countermovement jump', recordedAt: '2026-11-03T10:32:15', sampleRateHz: 1000, lines: [1, 2, 3, 4, 5] },
    }),
  ),
  made(
    'facts-in-german',
    { preamble: ['Athletin;Ada Erfunden', 'Körpermasse;64,2;kg', 'Datum;03.11.2026'], delimiter: ';' },
    gives(channels, 1000, ['metadata-read'], { metadata: { athlete: 'Ada Erfunden', bodyMassKg: 64.2, recordedAt: '2026-11-03', lines: [1, 2, 3] } }),
  ),
  made('date-that-could-be-two', { preamble: ['Date: 03/04/2026'] }, gives(channels, 1000, ['lines-before-header'], { metadata: { lines: [] } })),
  made('time-of-day-on-a-line-of-its-own', { preamble: ['Date: 23/11/2026', 'Time: 09:05'] }, gives(channels, 1000, ['metadata-read'], { metadata: { recordedAt: '2026-11-23T09:05:00', lines: [1, 2] } })),
  made('rate-that-the-stamps-belie', { preamble: ['Rate: 500 Hz'] }, gives(channels, 1000, ['metadata-read', 'rate-disagrees'])),
  made('unseen-characters-in-a-name', { preamble: ['Athlete: Ada\u202E \u0007Invented'] }, gives(channels, 1000, ['metadata-read'], { metadata: { athlete: 'Ada\uFFFD \uFFFDInvented', lines: [1] } })),
  made('forty-lines-above', { preamble: Array.from({ length: 40 }, (_, i) => `Remark ${i + 1}: nothing of note`) }, gives(channels, 1000, ['lines-before-header'])),
  made('numbers-above-the-headings', { preamble: ['Channel,1,2', 'Gain,10,10'] }, gives(channels, 1000, ['lines-before-header'])),
]

const ofMap = (map: NonNullable<Case['hints']>['map'], expected: Case): Case => ({ hints: { ...(map ? { map } : {}) }, ...expected })

/** One to three rows of headings, units beside and under, and none. */
const headings: MadeCase[] = [
  made('two-rows-of-headings', { head: [['', 'Left', 'Right'], ['Time (s)', 'Force (N)', 'Force (N)']] }, gives(channels, 1000)),
  made('three-rows-of-headings', { head: [['', 'Left', 'Right'], ['Time', 'Fz', 'Fz'], ['s', 'N', 'N']] }, gives(channels, 1000)),
  made(
    'words-over-several-columns',
    {
      head: [['', 'Left plate', '', 'Right plate', ''], ['Time (s)', 'Fz (N)', 'Fx (N)', 'Fz (N)', 'Fx (N)']],
      columns: [columns[0] ?? [], columns[1] ?? [], fixed(Array<number>(12).fill(1)), columns[2] ?? [], fixed(Array<number>(12).fill(2))],
    },
    gives(channels, 1000, ['columns-ignored']),
  ),
  made('units-above-the-headings', { head: [['s', 'N', 'N'], ['Time', 'Left', 'Right']] }, gives(channels, 1000)),
  made('units-in-square-brackets-below', { head: [['Time', 'Left', 'Right'], ['[ms]', '[kN]', '[kN]']], columns: [columns[0]?.map((cell) => `${Number(cell) * 1000}`) ?? [], fixed(rising(12).map((n) => n / 1000), 5), fixed(falling(12).map((n) => n / 1000), 5)] }, gives(channels, 1000)),
  made('units-after-commas', { head: [['Time, s', 'Left, N', 'Right, N']], delimiter: ';' }, gives(channels, 1000)),
  made('units-of-some-columns-below', { head: [['Time', 'Left', 'Right'], ['s', 'N', '-']] }, gives(channels, 1000, ['force-unit-assumed'])),
  made('empty-line-under-the-headings', { head: [plainHead, ['']] }, gives(channels, 1000)),
  made('headings-longer-than-the-rows', { head: [[...plainHead, 'Remarks']] }, gives(channels, 1000, ['columns-ignored'])),
  made('more-columns-than-headings', { head: [['Left (N)', 'Right (N)']] }, { error: { code: 'no-header' } }),
  made('no-headings-in-newtons', { head: [] }, { error: { code: 'no-header', line: 1, seen: '0.000,400.00,410.50' } }),
  made(
    'no-headings-with-a-map',
    { head: [] },
    ofMap(
      { time: { index: 0, name: '', unit: 's' }, forces: [{ index: 1, name: '', unit: 'N', channel: 'left' }, { index: 2, name: '', unit: 'N', channel: 'right' }] },
      gives(channels, 1000),
    ),
  ),
  made('the-same-heading-twice',
    { head: [['Time (s)', 'Force (N)', 'Force (N)']] },
    gives({ total: rising(12).map((n, i) => n + (channels.right?.[i] ?? 0)) }, 1000, ['feet-unknown']),
  ),
  made(
    'the-same-force-twice',
    { head: [['Time (s)', 'Force (N)', 'Force (N)']], columns: [columns[0] ?? [], force, force] },
    { error: { code: 'ambiguous-columns', line: 1 } },
  ),
  made(
    'feet-by-a-map',
    { head: [['Time (s)', 'Plate 1 (N)', 'Plate 2 (N)']] },
    ofMap(
      { time: { index: 0, name: 'Time (s)', unit: 's' }, forces: [{ index: 1, name: 'Plate 1 (N)', unit: 'N', channel: 'right' }, { index: 2, name: 'Plate 2 (N)', unit: 'N', channel: 'left' }] },
      gives({ right: channels.left ?? [], left: channels.right ?? [] }, 1000),
    ),
  ),
  made(
    'downward-by-a-map',
    { head: [['Time (s)', 'Out A', 'Out B']], columns: [columns[0] ?? [], fixed(rising(12).map((n) => -n / 2)), columns[2] ?? []] },
    ofMap(
      { time: { index: 0, name: 'Time (s)', unit: 's' }, forces: [{ index: 1, name: 'Out A', unit: 'N', channel: 'single', downward: true }] },
      gives({ single: rising(12).map((n) => thousandths(Number((-n / 2).toFixed(2)) * -1)) }, 1000),
    ),
  ),
  made(
    'rate-by-a-map',
    { head: [['Left (N)', 'Right (N)']], columns: twoForces },
    ofMap(
      { time: null, sampleRateHz: 250, forces: [{ index: 0, name: 'Left (N)', unit: 'N', channel: 'left' }, { index: 1, name: 'Right (N)', unit: 'N', channel: 'right' }] },
      gives(channels, 250, ['rate-from-map']),
    ),
  ),
  made(
    'map-for-a-column-without-numbers',
    { head: [[...plainHead, 'Remarks']], columns: [...columns, Array<string>(12).fill('fine')] },
    ofMap({ time: { index: 0, name: 'Time (s)', unit: 's' }, forces: [{ index: 3, name: 'Remarks', unit: 'N', channel: 'single' }] }, { error: { code: 'map-mismatch', column: 4 } }),
  ),
]

const oneForce = (name: string, heading: string, values: number[], decimals: number, expected: Case, preamble: string[] = []): MadeCase =>
  made(name, { preamble, head: [['Time (s)', heading]], columns: [seconds(12), fixed(values, decimals)] }, expected)
const scaled = (factor: number, decimals: number, newtons: number): { values: number[]; single: number[] } => {
  const values = rising(12).map((n) => Number((n / factor).toFixed(decimals)))
  return { values, single: values.map((value) => thousandths(value * newtons)) }
}
const kgf = scaled(9.80665, 3, 9.80665)
const lbf = scaled(4.4482216152605, 3, 0.45359237 * 9.80665)
const weights = scaled(784.532, 5, 80 * 9.80665)
const percent = scaled(7.84532, 3, (80 * 9.80665) / 100)
const kilo = scaled(1000, 5, 1000)

/** Units of force. */
const units: MadeCase[] = [
  oneForce('kilonewtons', 'Force (kN)', kilo.values, 5, gives({ single: kilo.single }, 1000)),
  oneForce('kilogram-force', 'Force (kgf)', kgf.values, 3, gives({ single: kgf.single }, 1000)),
  oneForce('kilograms', 'Load [kg]', kgf.values, 3, gives({ single: kgf.single }, 1000, ['mass-unit-as-force'])),
  oneForce('pound-force', 'Force (lbf)', lbf.values, 3, gives({ single: lbf.single }, 1000)),
  oneForce('pounds', 'Force (lbs)', lbf.values, 3, gives({ single: lbf.single }, 1000, ['mass-unit-as-force'])),
  oneForce('body-weights-and-the-mass-above', 'Force (BW)', weights.values, 5, gives({ single: weights.single }, 1000, ['metadata-read', 'from-body-weights']), ['Body mass: 80 kg']),
  oneForce('percent-of-body-weight-and-a-stated-mass', 'Force (%BW)', percent.values, 3, { hints: { bodyMassKg: 80 }, ...gives({ single: percent.single }, 1000, ['from-body-weights']) }),
  oneForce('no-unit-anywhere', 'Force', rising(12), 2, { error: { code: 'unit-unknown', line: 1, column: 2, seen: 'Force' }, proposal: { time: { index: 0, unit: 's' }, forces: [{ index: 1, channel: 'single' }] } }),
  oneForce('volts', 'Fz (V)', rising(12).map((n) => n / 100), 4, { error: { code: 'unit-unknown', seen: 'Fz (V)' } }),
]

const timed = (name: string, heading: string, stamps: string[], expected: Case, preamble: string[] = []): MadeCase =>
  made(name, { preamble, head: [[heading, 'Force (N)']], columns: [stamps, force], delimiter: ';' }, expected)
const range = (cell: (i: number) => string): string[] => Array.from({ length: 12 }, (_, i) => cell(i))

/** Time in every form. */
const times: MadeCase[] = [
  timed('milliseconds', 'Time (ms)', range((i) => `${2 * i}`), gives(single, 500)),
  timed('microseconds', 'Time (µs)', range((i) => `${1000 * i}`), gives(single, 1000, [], { time: { index: 0, unit: 'us' } })),
  timed('minutes', 'Time (min)', range((i) => (i / 6000).toFixed(8)), gives(single, 100, [], { time: { index: 0, unit: 'min' } })),
  timed('sample-numbers-and-a-rate', 'Sample', counts, gives(single, 1000, ['metadata-read', 'rate-from-file'], { time: { index: 0, unit: 'samples' } }), ['Rate: 1000 Hz']),
  timed('sample-numbers-and-a-stated-rate', 'Frame', counts, { hints: { sampleRateHz: 240 }, ...gives(single, 240, ['rate-from-hint']) }),
  timed('sample-numbers-without-a-rate', 'Sample no.', counts, { error: { code: 'rate-unknown', column: 1 }, proposal: { time: { index: 0, unit: 'samples' }, forces: [{ index: 1, channel: 'single' }] } }),
  timed('sample-numbers-in-twos', 'Sample', range((i) => `${2 * i}`), { error: { code: 'uneven-time', column: 1 } }, ['Rate: 1000 Hz']),
  made(
    'frames-and-samples-within-them',
    { preamble: ['Frame rate: 100 Hz'], head: [['Frame', 'Sub Frame', 'Fz (N)']], columns: [range((i) => `${1 + Math.floor(i / 4)}`), range((i) => `${i % 4}`), force] },
    gives(single, 400, ['metadata-read', 'rate-from-file']),
  ),
  made(
    'frames-and-the-rate-of-samples',
    { preamble: ['Analog rate: 1000 Hz'], head: [['Frame', 'Sub Frame', 'Fz (N)']], columns: [range((i) => `${1 + Math.floor(i / 3)}`), range((i) => `${1 + (i % 3)}`), force] },
    gives(single, 1000, ['metadata-read', 'rate-from-file']),
  ),
  timed('times-of-day', 'Clock', range((i) => `10:32:15.${String(5 * i).padStart(3, '0')}`), gives(single, 200, ['time-unit-assumed'], { time: { index: 0, unit: 's' } })),
  timed('times-of-day-with-their-unit', 'Time (hh:mm:ss.fff)', range((i) => `10:32:15.${String(5 * i).padStart(3, '0')}`), gives(single, 200, [], { time: { index: 0, unit: 'clock' } })),
  timed('past-midnight', 'Time (hh:mm:ss.fff)', range((i) => (i < 6 ? `23:59:59.${94 + i}` : `00:00:00.0${i - 6}`)), gives(single, 100)),
  timed('dates-and-times', 'Timestamp', range((i) => `2026-11-03T10:32:15.${String(10 * i).padStart(3, '0')}Z`), gives(single, 100, ['time-unit-assumed'])),
  timed('minutes-and-seconds', 'Elapsed', range((i) => `00:07.${String(10 * i).padStart(3, '0')}`), gives(single, 100, ['time-unit-assumed'])),
  timed('milliseconds-since-1970', 'Timestamp (ms)', range((i) => `${1_793_700_000_000 + 4 * i}`), gives(single, 250)),
  made('no-time-and-no-rate', { head: [['Left (N)', 'Right (N)']], columns: twoForces }, { error: { code: 'rate-unknown' }, proposal: { time: null, forces: [{ index: 0, channel: 'left' }, { index: 1, channel: 'right' }] } }),
  made('stated-rate-against-stamps', {}, { hints: { sampleRateHz: 500 }, ...gives(channels, 1000) }),
]

export const heads: MadeCase[] = [...preambles, ...headings, ...units, ...times]
