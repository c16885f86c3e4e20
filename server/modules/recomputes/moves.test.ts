import { describe, expect, it } from 'vitest'
import type { TrialCheck } from '../../../shared/mechanics/types.ts'
import { medianOf } from './bins.ts'
import { type Compared, compareTrial } from './compare.ts'
import { addMoves, noMoves } from './moves.ts'

const check = (verdict: TrialCheck['verdict']): TrialCheck => ({
  key: 'closing-balance',
  verdict,
  affects: ['jump'],
  measured: 0.1,
  limit: 0.1,
  unit: 'm/s',
  sentence: '',
  remedy: '',
})
const height = (value: number, U: number | null = 0.01, URepeat: number | null = 0.004): Compared => ({
  metrics: { jumpHeightImpulse: { value, U, URepeat } },
  sides: null,
  checks: [],
})
const compared = (...pairs: [Compared, Compared][]) => {
  const moves = noMoves()
  for (const [n, [before, after]] of pairs.entries()) compareTrial(moves, `trial ${n}`, before, after)
  return moves
}

describe('how analyses made again differ', () => {
  it('is nothing where only the last digits of a computation differ', () => {
    const moves = compared([height(0.3), height(0.3 * (1 + 1e-12))])
    expect(moves).toEqual({ ...noMoves(), trials: 1 })
  })

  it('is told of each figure by its median, right to 1 %, and its greatest change with the sign', () => {
    const changes = [0.001, 0.002, 0.003, 0.004, -0.02]
    const { figures } = compared(
      ...changes.map((change): [Compared, Compared] => [height(0.3), height(0.3 + change)]),
    )
    const { moved, changes: sizes, greatest, multiples, greatestMultiple } = figures.jumpHeightImpulse
    expect(moved).toBe(5)
    expect(greatest).toBeCloseTo(-0.02)
    expect(greatestMultiple).toBeCloseTo(5)
    expect(Math.abs(medianOf(sizes)! / 0.003 - 1)).toBeLessThan(0.01)
    expect(Math.abs(medianOf(multiples)! / 0.75 - 1)).toBeLessThan(0.01)
  })

  it('tells a wider give or take from a value that moved', () => {
    const { figures, trialsMoved } = compared([height(0.3, 0.01), height(0.3, 0.02)])
    expect(figures.jumpHeightImpulse).toMatchObject({ moved: 0, uMoved: 1, greatestMultiple: null })
    expect(Math.abs(medianOf(figures.jumpHeightImpulse.uFactors)! / 2 - 1)).toBeLessThan(0.01)
    expect(trialsMoved).toBe(1)
  })

  it('says no multiple where the give or take is unknown', () => {
    const { figures, greatest } = compared([height(0.3, null, null), height(0.31, null, null)])
    expect(figures.jumpHeightImpulse).toMatchObject({ moved: 1, greatestMultiple: null })
    expect(greatest).toEqual([])
  })

  it('counts figures that appear and vanish, feet and asymmetry apart', () => {
    const figure = { value: 900, U: 9, k: 2, URepeat: 3, kRepeat: 2 }
    const asymmetry = { peakForce: { ...figure, larger: 'left' as const, zeroWithin: null } }
    const feet = { left: { peakForce: figure }, right: {}, asymmetry }
    const { figures } = compared([height(0.3), { metrics: {}, sides: feet, checks: [] }])
    expect(figures.jumpHeightImpulse).toMatchObject({ vanished: 1, appeared: 0 })
    expect(figures['peakForce/left']).toMatchObject({ appeared: 1 })
    expect(figures['peakForce/asymmetry']).toMatchObject({ appeared: 1 })
    expect(Object.keys(figures)).toHaveLength(3)
  })

  it('counts verdicts by whether a fail comes or goes', () => {
    const judged = (...verdicts: TrialCheck['verdict'][]) => ({ ...height(0.3), checks: verdicts.map(check) })
    const { checks } = compared(
      [judged('pass'), judged('fail')],
      [judged(), judged('fail')],
      [judged('fail'), judged('caution')],
      [judged('pass'), judged('caution')],
      [judged('caution'), judged('caution')],
    )
    expect(checks).toEqual({ toFail: 2, fromFail: 1, other: 1 })
  })

  it('is the same counted in one go or in parts', () => {
    const pairs = [0.01, -0.03, 0.002, 0].map((d): [Compared, Compared] => [height(0.3), height(0.3 + d)])
    const sum = noMoves()
    addMoves(sum, compared(...pairs.slice(0, 1)))
    addMoves(sum, compared(...pairs.slice(1)))
    const whole = compared(...pairs)
    expect({ ...sum, greatest: [] }).toEqual({ ...whole, greatest: [] })
    expect(sum.greatest.map(({ multiple }) => multiple)).toEqual(
      whole.greatest.map(({ multiple }) => multiple).sort((a, b) => b - a),
    )
  })

  it('keeps the twenty greatest moves, one a trial', () => {
    const sum = noMoves()
    for (let n = 1; n <= 30; n++) addMoves(sum, compared([height(0.3), height(0.3 + n / 1000)]))
    expect(sum.greatest).toHaveLength(20)
    expect(sum.greatest[0].after).toBeCloseTo(0.33)
    expect(sum.greatest[19].after).toBeCloseTo(0.311)
  })
})
