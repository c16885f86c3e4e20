import { describe, expect, it } from 'vitest'
import { catalogue, isMetricKey, metricKeys } from './catalogue.ts'
import { analysedProtocols } from './protocols/analysed.ts'

describe('the catalogue', () => {
  it.each(metricKeys)('says of %s its name, unit, display, source and a sentence for athletes', (key) => {
    const metric = catalogue[key]
    expect(metric.key).toBe(key)
    expect(metric.name).toMatch(/^\S.*\S$/)
    expect(metric.source.length).toBeGreaterThan(9)
    expect(metric.athleteSentence).toMatch(/^[A-Z].*\.$/)
    expect(metric.protocols.length).toBeGreaterThan(0)
    for (const protocol of metric.protocols) expect(analysedProtocols).toContain(protocol)
    expect(Number.isInteger(metric.display.decimals)).toBe(true)
    expect(metric.display.factor).toBeGreaterThan(0)
  })

  it('gives no two metrics the same name', () => {
    const names = metricKeys.map((key) => catalogue[key].name)
    expect(new Set(names).size).toBe(names.length)
  })

  it('keeps one unit a key: per body weight and per kilogram have keys of their own', () => {
    for (const key of metricKeys) {
      const { unit } = catalogue[key]
      if (key.endsWith('PerBodyWeight')) expect(unit).toMatch(/^BW/)
      else if (key.endsWith('PerKg')) expect(unit).toBe('W/kg')
      else expect(unit).not.toMatch(/BW|\/kg/)
    }
  })

  it('marks identities by a metric that exists and is not itself a copy', () => {
    for (const key of metricKeys) {
      const { sameFactAs: origin, sameFactIn: within, protocols } = catalogue[key]
      if (origin === undefined) continue
      expect(isMetricKey(origin), key).toBe(true)
      expect(origin).not.toBe(key)
      expect(protocols, key).toEqual(expect.arrayContaining([...(within ?? [])]))
    }
    expect(isMetricKey('toString')).toBe(false)
  })
})
