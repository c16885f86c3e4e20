import { describe, expect, it } from 'vitest'
import type { SheetTrial } from '../../../shared/contracts/sessions.ts'
import { cellName } from './cell-words.ts'
import { sheetCounts, sheetRows } from './sheet-rows.ts'

const analysis = { id: 'a', metrics: {}, withheld: [], cautions: 0, fails: 0, worstSentence: null }
function trial(id: string, given: Partial<SheetTrial> = {}): SheetTrial {
  return {
    id,
    uploadId: 'u',
    fileName: `${id}.csv`,
    athleteId: null,
    assignedBy: null,
    test: { protocol: 'cmj', side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips' },
    setAside: null,
    preview: [],
    analysis,
    version: 1,
    ...given,
  }
}
const athletes = [
  { athleteId: 'mara', name: 'Mara', means: {} },
  { athleteId: 'tomas', name: 'Tomas', means: {} },
]

describe('sheetRows(sheet)', () => {
  it('keeps athletes without trials, and puts trials without an athlete in the Tray', () => {
    const { rows, tray, columns } = sheetRows({
      athletes,
      trials: [trial('1', { athleteId: 'tomas' }), trial('2'), trial('3', { athleteId: 'tomas' })],
    })
    expect(rows.map((row) => row.trials.map(({ id }) => id))).toEqual([[], ['1', '3']])
    expect(tray.map(({ id }) => id)).toEqual(['2'])
    expect(columns).toBe(2)
  })

  it('has one trial column before anything is there', () => {
    expect(sheetRows({ athletes: [], trials: [] }).columns).toBe(1)
  })
})

describe('sheetCounts(sheet)', () => {
  it('publishes what is on an athlete, analysed and not set aside', () => {
    const counts = sheetCounts({
      trials: [
        trial('1', { athleteId: 'mara' }),
        trial('2', { athleteId: 'mara' }),
        trial('3', { athleteId: 'tomas', setAside: { reason: 'moved', byName: 'Coach' } }),
        trial('4', { athleteId: 'tomas', analysis: null }),
        trial('5'),
      ],
    })
    expect(counts).toEqual({
      trials: 5,
      setAside: 1,
      inTray: 1,
      unanalysed: 1,
      toPublish: { athletes: 1, trials: 2 },
    })
  })
})

describe('cellName(athlete, n, trial)', () => {
  it('says the height with its uncertainty and what to look at', () => {
    const named = trial('1', {
      analysis: {
        ...analysis,
        metrics: { jumpHeightImpulse: { value: 0.345, U: 0.006 } },
        cautions: 1,
        worstSentence: 'The stance was short.',
      },
    })
    expect(cellName('Mara', 2, named)).toBe(
      'Mara, trial 2, 34.5 ±\u00a00.6 cm, 1 to look at, The stance was short.',
    )
  })

  it('says why a trial is set aside, that one is not analysed yet, and that a height is withheld', () => {
    expect(cellName('Mara', 1, trial('1', { setAside: { reason: 'moved', byName: 'C' } }))).toContain(
      'set aside: moved',
    )
    expect(cellName('Mara', 1, trial('1', { analysis: null }))).toContain('being analysed')
    const withheld = {
      ...analysis,
      metrics: { jumpHeightImpulse: { value: 0.3, U: null } },
      withheld: ['jumpHeightImpulse'],
    }
    expect(cellName('Mara', 1, trial('1', { analysis: withheld }))).toContain('withheld 30.0 cm')
  })
})
