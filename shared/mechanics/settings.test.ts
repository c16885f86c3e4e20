import { describe, expect, it } from 'vitest'
import { defaultSettings, settingDefinitions } from './settings.ts'

describe('the settings', () => {
  it.each(Object.entries(settingDefinitions))('say of %s its unit, source and effect', (key, definition) => {
    expect(Number.isFinite(definition.value)).toBe(true)
    expect(definition.unit).not.toBe('')
    expect(definition.source.length).toBeGreaterThan(6)
    expect(definition.effect).toMatch(/^[A-Z]/)
    expect(defaultSettings[key as keyof typeof settingDefinitions]).toBe(definition.value)
  })

  it('cannot be changed by whoever reads them', () => {
    expect(Object.isFrozen(defaultSettings)).toBe(true)
  })
})
