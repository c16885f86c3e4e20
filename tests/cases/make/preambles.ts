import type { Case } from '../case.ts'
import { gives } from './text.ts'
import type { MadeCase } from './text.ts'

import { channels, twoForces, made } from './two-plates.ts'

/** Forces alone, their rate above them. */
const untimed = (name: string, preamble: string[], expected: Case, delimiter = ','): MadeCase =>
  made(name, { preamble, delimiter, head: [['Left (N)', 'Right (N)']], columns: twoForces }, expected)
const ofRate = (rateHz: number, lines = 1): Case =>
  gives(channels, rateHz, ['metadata-read', 'rate-from-file'], {
    metadata: { sampleRateHz: rateHz, lines: [lines] },
  })

/** Lines above the table. */
export const preambles: MadeCase[] = [
  untimed('rate-above-the-table', ['Sampling rate: 500 Hz'], ofRate(500)),
  untimed('rate-and-unit-in-cells', ['Abtastrate;1000;Hz'], ofRate(1000), ';'),
  untimed('rate-in-kilohertz', ['Sampling frequency = 1.2 kHz'], ofRate(1200)),
  untimed('rate-unit-in-brackets', ['# Sample rate (Hz), 2000'], ofRate(2000)),
  untimed('rate-with-a-decimal-comma', ['Frecuencia de muestreo: 1000,0 Hz'], ofRate(1000), ';'),
  untimed('rate-of-no-plate', ['Sampling rate: 2 Hz'], {
    error: { code: 'rate-unknown' },
    proposal: {
      time: null,
      forces: [
        { index: 0, channel: 'left' },
        { index: 1, channel: 'right' },
      ],
    },
  }),
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
      metadata: {
        athlete: 'Ada Invented',
        bodyMassKg: 81.5,
        test: 'Countermovement jump',
        recordedAt: '2026-11-03T10:32:15',
        sampleRateHz: 1000,
        lines: [1, 2, 3, 4, 5],
      },
    }),
  ),
  made(
    'facts-in-german',
    { preamble: ['Athletin;Ada Erfunden', 'Körpermasse;64,2;kg', 'Datum;03.11.2026'], delimiter: ';' },
    gives(channels, 1000, ['metadata-read'], {
      metadata: { athlete: 'Ada Erfunden', bodyMassKg: 64.2, recordedAt: '2026-11-03', lines: [1, 2, 3] },
    }),
  ),
  made(
    'date-that-could-be-two',
    { preamble: ['Date: 03/04/2026'] },
    gives(channels, 1000, ['lines-before-header'], { metadata: { lines: [] } }),
  ),
  made(
    'time-of-day-on-a-line-of-its-own',
    { preamble: ['Date: 23/11/2026', 'Time: 09:05'] },
    gives(channels, 1000, ['metadata-read'], {
      metadata: { recordedAt: '2026-11-23T09:05:00', lines: [1, 2] },
    }),
  ),
  made(
    'rate-that-the-stamps-belie',
    { preamble: ['Rate: 500 Hz'] },
    gives(channels, 1000, ['metadata-read', 'rate-disagrees']),
  ),
  made(
    'unseen-characters-in-a-name',
    { preamble: ['Athlete: Ada\u202E \u0007Invented'] },
    gives(channels, 1000, ['metadata-read'], {
      metadata: { athlete: 'Ada\uFFFD \uFFFDInvented', lines: [1] },
    }),
  ),
  made(
    'forty-lines-above',
    { preamble: Array.from({ length: 40 }, (_, i) => `Remark ${i + 1}: nothing of note`) },
    gives(channels, 1000, ['lines-before-header']),
  ),
  made(
    'numbers-above-the-headings',
    { preamble: ['Channel,1,2', 'Gain,10,10'] },
    gives(channels, 1000, ['lines-before-header']),
  ),
]
