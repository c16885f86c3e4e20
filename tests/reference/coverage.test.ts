import { describe, expect, it } from 'vitest'
import { syntheticProtocols } from '../../seed/synthetic/attempts.ts'
import { coverageByMetric } from './coverage.ts'
import { brokenLimits, leastShare, limits } from './coverage-limits.ts'
import { coveredMetrics, measureLot } from './coverage-outcomes.ts'
import { coverageTrial } from './coverage-trials.ts'
import { engineProtocols } from './engine-protocols.ts'

const TRIALS = 200
/** What 200 trials of mixed kinds may show on top of the limits that 2,000 are held to. */
const SLACK = { width: 1.3, sd: 1.15 }

it('is put to the proof for every protocol of the engine', () => {
  expect(engineProtocols).toContain('cmj')
})

describe.each(engineProtocols)('the uncertainty of the engine on synthetic trials of %s', (protocol) => {
  const coverage = coverageByMetric(measureLot({ of: protocol, from: 0, to: TRIALS }))

  it.each(coveredMetrics[protocol])('of %s holds the truth as often as it says', (metric) => {
    const of = coverage[metric]
    if (!of) throw new Error('The figure was not measured.')
    expect(of.covered).toBeGreaterThanOrEqual(leastShare(TRIALS, limits.overall.least))
    for (const [name, { covered, trials }] of Object.entries(of.strata))
      expect(covered, name).toBeGreaterThanOrEqual(leastShare(trials, limits.stratum))
    expect(of.missing).toBe(0)
    expect(of.withoutU).toBeLessThanOrEqual(limits.withoutU)
    expect(of.strata['noise clean']?.withoutU).toBe(0)
  })

  it('is not bought with wide intervals', () => {
    for (const metric of coveredMetrics[protocol])
      expect(coverage[metric]?.widthRatio, metric).toBeLessThan(SLACK.width * limits.width)
  })

  it('goes with a takeoff velocity free of bias', () => {
    if (!coverage.takeoffVelocity) return
    expect(Math.abs(coverage.takeoffVelocity.bias)).toBeLessThan(limits.velocityBias)
  })
})

describe('the takeoff velocity in a clean laboratory', () => {
  const { takeoffVelocity } = coverageByMetric(measureLot({ of: 'laboratory', from: 0, to: TRIALS }))

  it('is as exact as noise and weighing allow', () => {
    expect(takeoffVelocity?.sd).toBeLessThan(SLACK.sd * limits.laboratorySd)
    expect(Math.abs(takeoffVelocity?.bias ?? NaN)).toBeLessThan(limits.velocityBias)
  })
})

describe.each(syntheticProtocols)('the drawn trials of %s', (protocol) => {
  it('never pull on the plates', () => {
    for (let number = 0; number < 15; number++) {
      const { force, marks } = coverageTrial(protocol, number, true).trial
      for (let timeS = 0; timeS < marks.restS; timeS += 0.01) expect(force(timeS)).toBeGreaterThan(-1e-6)
    }
  })
})

describe('the limits', () => {
  const good = { trials: 2000, covered: 0.95, bias: 0, sd: 1, medianU: 2, widthRatio: 1, missing: 0 }
  const stratum = { ...good, withoutU: 0 }

  it('hold for intervals that are as they should be', () => {
    expect(brokenLimits('rsi', { ...stratum, strata: { 'noise clean': stratum } })).toStrictEqual([])
  })

  it.each([
    ['too few', { covered: 0.92 }, /covers only 92.0 %/],
    ['too many', { covered: 0.98 }, /covers as much as 98.0 %/],
    ['too wide', { widthRatio: 1.4 }, /1.40 times as wide/],
    ['none', { withoutU: 0.03 }, /no U in 3.0 %/],
    ['no value', { missing: 0.03 }, /missing in 3.0 %/],
    ['biased', { bias: -0.006 }, /biased by -0.0060 m\/s/],
  ])('are broken by %s', (_, change, words) => {
    const coverage = { ...stratum, ...change, strata: { 'noise clean': stratum } }
    expect(brokenLimits('takeoffVelocity', coverage).join()).toMatch(words)
  })

  it('are broken by one bad stratum, and by one clean trial without U', () => {
    const strata = {
      'rate 500 Hz': { ...stratum, covered: 0.89 },
      'noise clean': { ...stratum, withoutU: 0.001 },
    }
    expect(brokenLimits('rsi', { ...stratum, strata })).toStrictEqual([
      'rsi covers only 89.0 % of rate 500 Hz',
      'rsi has no U in 0.1 % of the clean trials',
    ])
  })

  it('allow few trials what chance does', () => {
    expect(leastShare(200, 0.93)).toBeGreaterThan(0.86)
    expect(leastShare(200, 0.93)).toBeLessThan(0.9)
    expect(leastShare(20_000, 0.93)).toBeGreaterThan(0.924)
  })
})
