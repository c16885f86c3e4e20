import { describe, expect, it } from 'vitest'
import { catalogue } from '../../../shared/mechanics/catalogue.ts'
import { figureText, resultsSummary } from './results-summary.ts'

const height = catalogue.jumpHeightImpulse

describe('resultsSummary(means, metric)', () => {
  it('says that there is nothing yet', () => {
    expect(resultsSummary([], height)).toBe(`${height.name}: no results yet.`)
  })

  it('gives a single result with its date and uncertainty', () => {
    expect(resultsSummary([{ date: '2026-11-12', value: 0.35, U: 0.004 }], height)).toBe(
      `${height.name}: one result, 35.0 ±\u00a00.4 cm on 12 November 2026.`,
    )
  })

  it('gives number, dates, range and the newest of several', () => {
    const means = [
      { date: '2026-10-01', value: 0.36, U: null },
      { date: '2026-11-12', value: 0.35, U: 0.004 },
    ]
    expect(resultsSummary(means, height)).toBe(
      `${height.name}: 2 results from 1 October 2026 to 12 November 2026, between 35.0 and 36.0 cm. The newest is 35.0 ±\u00a00.4 cm.`,
    )
  })
})

describe('figureText(figure, metric)', () => {
  it('leaves an unknown uncertainty out', () => {
    expect(figureText({ value: 0.35, U: null }, height)).toBe('35.0 cm')
  })
})
