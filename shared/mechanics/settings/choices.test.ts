import { describe, expect, it } from 'vitest'
import { sampled } from '../../../tests/setup/closed-form-cmj.ts'
import { analyse } from '../analyse.ts'
import { defaultSettings } from '../settings.ts'
import { inOrder, numberChoiceKeys, numberChoices, onlyChanged, problemsOf, settingsWith } from './choices.ts'

describe('the settings that are a matter of choice', () => {
  it.each(numberChoiceKeys)('keep the default of %s within its bounds', (key) => {
    const { min, max } = numberChoices[key]
    expect(defaultSettings[key]).toBeGreaterThanOrEqual(min)
    expect(defaultSettings[key]).toBeLessThanOrEqual(max)
  })

  it.each(numberChoiceKeys.flatMap((key) => [[key, 'min'] as const, [key, 'max'] as const]))(
    'let the engine find the jump with %s at its %s',
    (key, end) => {
      const options = { gravity: 9.80665, calibrationU: { left: 0.005, right: 0.005 } }
      const recording = sampled({ durationS: 8, channels: 'feet' })
      const settings = settingsWith({ [key]: numberChoices[key][end] })
      const [trial] = analyse(recording, options, settings).trials
      const [usual] = analyse(recording, options).trials
      const velocity = trial?.metrics.takeoffVelocity?.value
      // The greatest effect is that of the event force: some 8 mm/s for each 10 N on this gentle flank.
      expect(velocity).toBeGreaterThan(usual.metrics.takeoffVelocity.value - 0.04)
      expect(velocity).toBeLessThan(usual.metrics.takeoffVelocity.value + 0.04)
      for (const { value, U } of Object.values(trial.metrics)) {
        expect(Number.isFinite(value)).toBe(true)
        expect(U === null || (Number.isFinite(U) && U >= 0)).toBe(true)
      }
    },
  )
})

describe('onlyChanged', () => {
  it('drops what stands at its default, and keeps one order', () => {
    const changed = onlyChanged({ onsetSd: 4, eventForceN: 20, onsetLeadS: defaultSettings.onsetLeadS })
    expect(JSON.stringify(changed)).toBe('{"eventForceN":20,"onsetSd":4}')
    expect(onlyChanged({ onsetRule: 'fraction' })).toEqual({})
  })
})

describe('problemsOf', () => {
  it('finds none in the defaults', () => expect(problemsOf({})).toEqual({}))

  it('names a value beyond its bounds, and one that is no number', () => {
    expect(problemsOf({ eventForceN: 51 })).toEqual({ eventForceN: 'Give 5 to 50 N' })
    expect(problemsOf({ eventForceN: NaN })).toEqual({ eventForceN: 'Give 5 to 50 N' })
  })

  it.each(inOrder)('keeps %s below %s', (lower, upper) => {
    const meeting = Math.max(numberChoices[lower].min, numberChoices[upper].min)
    const problems = problemsOf({ [lower]: meeting, [upper]: meeting })
    expect(Object.keys(problems)).not.toEqual([])
  })

  it('names the changed one of a pair', () => {
    expect(problemsOf({ massCaution: 0.15 })).toEqual({ massCaution: 'Must stay below 0.1 of massFail' })
    expect(problemsOf({ massFail: 0.03 })).toEqual({ massFail: 'Must stay above 0.04 of massCaution' })
  })
})
