import { describe, expect, it } from 'vitest'
import { catalogue, isMetricKey } from '../mechanics/catalogue.ts'
import { analysedProtocols } from '../mechanics/protocols/analysed.ts'
import type { Protocol } from '../mechanics/types.ts'
import { headlineOf, massMetric, metricsOfTest, sheetMetrics } from './sheet-metrics.ts'

const protocols = Object.keys(metricsOfTest) as Protocol[]

describe('metricsOfTest', () => {
  it.each(analysedProtocols)('has only what the engine gives of a %s', (protocol) => {
    for (const key of [...metricsOfTest[protocol], massMetric]) {
      expect(isMetricKey(key) && catalogue[key].protocols, key).toContain(protocol)
    }
  })

  it('names five or six of each test, none twice', () => {
    for (const protocol of protocols) {
      const metrics = metricsOfTest[protocol]
      expect([5, 6]).toContain(metrics.length)
      expect(new Set(metrics).size).toBe(metrics.length)
    }
  })
})

describe('headlineOf(protocol)', () => {
  it('is the height of a jump, the reactive strength of a rebound, the peak of a landing', () => {
    expect(protocols.map((protocol) => [protocol, headlineOf(protocol)])).toEqual([
      ['cmj', 'jumpHeightImpulse'],
      ['slcmj', 'jumpHeightImpulse'],
      ['sj', 'jumpHeightImpulse'],
      ['dj', 'rsi'],
      ['hops', 'rsiBestFive'],
      ['dropLanding', 'landingPeakForcePerBodyWeight'],
    ])
  })
})

describe('sheetMetrics', () => {
  it('holds every one of them once', () => {
    const wanted = new Set([...protocols.flatMap((protocol) => [...metricsOfTest[protocol]]), massMetric])
    expect(new Set(sheetMetrics)).toEqual(wanted)
    expect(sheetMetrics).toHaveLength(wanted.size)
  })
})
