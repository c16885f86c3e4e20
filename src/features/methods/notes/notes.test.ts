import { describe, expect, test } from 'vitest'
import { catalogue, isMetricKey, metricKeys } from '../../../../shared/mechanics/catalogue.ts'
import { checkKeys, isCheckKey } from '../../../../shared/mechanics/checks/check-definitions.ts'
import { mathOf } from '../math-of.ts'
import { settingWords } from '../setting-words.ts'
import { checkNotes } from './check-notes.ts'
import { metricNotes } from './metric-notes.ts'

describe('the Method notes', () => {
  test('there is one for every metric and every check, and no key means both', () => {
    expect(Object.keys(metricNotes).sort()).toEqual([...metricKeys].sort())
    expect(Object.keys(checkNotes).sort()).toEqual([...checkKeys].sort())
    expect(metricKeys.filter((key) => isCheckKey(key))).toEqual([])
    expect(checkKeys.filter((key) => isMetricKey(key))).toEqual([])
  })

  test.each(metricKeys)('%s: its formula sets as MathML that the content policy allows', (key) => {
    const math = mathOf(metricNotes[key].formula)
    expect(math).toMatch(/^<math display="block".*<\/math>$/)
    expect(math).not.toMatch(/style=|merror|temml-error/)
  })

  test.each(metricKeys)('%s: says how far its source can be leaned on as the catalogue does', (key) => {
    const { evidence, limits, definition, read, from } = metricNotes[key]
    const { source } = catalogue[key]
    if (/^Definition/.test(source)) expect(evidence).toBe('definition')
    if (/^Common practice(?!.*from memory)/.test(source)) expect(evidence).toBe('practice')
    if (/from memory/.test(source)) expect(evidence).toBe('memory')
    for (const text of [definition, limits, read]) expect(text).toMatch(/^.*\.$/)
    expect(from).not.toContain(key)
  })

  test('a setting is said in words', () => {
    expect(settingWords('eventForceN')).toBe('event force')
    expect(settingWords('gravityU')).toBe('gravity uncertainty')
    expect(settingWords('onsetSd')).toBe('onset SD')
    expect(settingWords('lowestSampleRateHz')).toBe('lowest sample rate')
  })
})
