import type { Case } from '../case.ts'
import { falling, fixed, gives, plainHead, rising, thousandths } from './text.ts'
import type { MadeCase } from './text.ts'

import { columns, channels, force, twoForces, made } from './two-plates.ts'

const ofMap = (map: NonNullable<Case['hints']>['map'], expected: Case): Case => ({
  hints: { ...(map ? { map } : {}) },
  ...expected,
})

/** One to three rows of headings, units beside and under, and none. */
export const headings: MadeCase[] = [
  made(
    'two-rows-of-headings',
    {
      head: [
        ['', 'Left', 'Right'],
        ['Time (s)', 'Force (N)', 'Force (N)'],
      ],
    },
    gives(channels, 1000),
  ),
  made(
    'three-rows-of-headings',
    {
      head: [
        ['', 'Left', 'Right'],
        ['Time', 'Fz', 'Fz'],
        ['s', 'N', 'N'],
      ],
    },
    gives(channels, 1000),
  ),
  made(
    'words-over-several-columns',
    {
      head: [
        ['', 'Left plate', '', 'Right plate', ''],
        ['Time (s)', 'Fz (N)', 'Fx (N)', 'Fz (N)', 'Fx (N)'],
      ],
      columns: [
        columns[0] ?? [],
        columns[1] ?? [],
        fixed(Array<number>(12).fill(1)),
        columns[2] ?? [],
        fixed(Array<number>(12).fill(2)),
      ],
    },
    gives(channels, 1000, ['columns-ignored']),
  ),
  made(
    'units-above-the-headings',
    {
      head: [
        ['s', 'N', 'N'],
        ['Time', 'Left', 'Right'],
      ],
    },
    gives(channels, 1000),
  ),
  made(
    'units-in-square-brackets-below',
    {
      head: [
        ['Time', 'Left', 'Right'],
        ['[ms]', '[kN]', '[kN]'],
      ],
      columns: [
        columns[0]?.map((cell) => `${Number(cell) * 1000}`) ?? [],
        fixed(
          rising(12).map((n) => n / 1000),
          5,
        ),
        fixed(
          falling(12).map((n) => n / 1000),
          5,
        ),
      ],
    },
    gives(channels, 1000),
  ),
  made(
    'units-after-commas',
    { head: [['Time, s', 'Left, N', 'Right, N']], delimiter: ';' },
    gives(channels, 1000),
  ),
  made(
    'units-of-some-columns-below',
    {
      head: [
        ['Time', 'Left', 'Right'],
        ['s', 'N', '-'],
      ],
    },
    gives(channels, 1000, ['force-unit-assumed']),
  ),
  made('empty-line-under-the-headings', { head: [plainHead, ['']] }, gives(channels, 1000)),
  made(
    'headings-longer-than-the-rows',
    { head: [[...plainHead, 'Remarks']] },
    gives(channels, 1000, ['columns-ignored']),
  ),
  made('more-columns-than-headings', { head: [['Left (N)', 'Right (N)']] }, { error: { code: 'no-header' } }),
  made(
    'no-headings-in-newtons',
    { head: [] },
    { error: { code: 'no-header', line: 1, seen: '0.000,400.00,410.50' } },
  ),
  made(
    'no-headings-with-a-map',
    { head: [] },
    ofMap(
      {
        time: { index: 0, name: '', unit: 's' },
        forces: [
          { index: 1, name: '', unit: 'N', channel: 'left' },
          { index: 2, name: '', unit: 'N', channel: 'right' },
        ],
      },
      gives(channels, 1000),
    ),
  ),
  made(
    'the-same-heading-twice',
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
      {
        time: { index: 0, name: 'Time (s)', unit: 's' },
        forces: [
          { index: 1, name: 'Plate 1 (N)', unit: 'N', channel: 'right' },
          { index: 2, name: 'Plate 2 (N)', unit: 'N', channel: 'left' },
        ],
      },
      gives({ right: channels.left ?? [], left: channels.right ?? [] }, 1000),
    ),
  ),
  made(
    'downward-by-a-map',
    {
      head: [['Time (s)', 'Out A', 'Out B']],
      columns: [columns[0] ?? [], fixed(rising(12).map((n) => -n / 2)), columns[2] ?? []],
    },
    ofMap(
      {
        time: { index: 0, name: 'Time (s)', unit: 's' },
        forces: [{ index: 1, name: 'Out A', unit: 'N', channel: 'single', downward: true }],
      },
      gives({ single: rising(12).map((n) => thousandths(Number((-n / 2).toFixed(2)) * -1)) }, 1000),
    ),
  ),
  made(
    'rate-by-a-map',
    { head: [['Left (N)', 'Right (N)']], columns: twoForces },
    ofMap(
      {
        time: null,
        sampleRateHz: 250,
        forces: [
          { index: 0, name: 'Left (N)', unit: 'N', channel: 'left' },
          { index: 1, name: 'Right (N)', unit: 'N', channel: 'right' },
        ],
      },
      gives(channels, 250, ['rate-from-map']),
    ),
  ),
  made(
    'map-for-a-column-without-numbers',
    { head: [[...plainHead, 'Remarks']], columns: [...columns, Array<string>(12).fill('fine')] },
    ofMap(
      {
        time: { index: 0, name: 'Time (s)', unit: 's' },
        forces: [{ index: 3, name: 'Remarks', unit: 'N', channel: 'single' }],
      },
      { error: { code: 'map-mismatch', column: 4 } },
    ),
  ),
]
