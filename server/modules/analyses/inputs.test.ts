import { describe, expect, it } from 'vitest'
import {
  engineOptions,
  hashInputs,
  inputsOf,
  nothingKnown,
  remadeWith,
  settingsOf,
  type TrialToAnalyse,
} from './inputs.ts'
import { defaultSettings } from '../../../shared/mechanics/settings.ts'

const trial: TrialToAnalyse = {
  test: { protocol: 'cmj', side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips' },
  recordedMassKg: 71,
  channels: ['left', 'right'],
  movedEvents: null,
}
const samples = Uint8Array.of(1, 2, 3)
const hash = (change: Partial<TrialToAnalyse> = {}, bytes = samples) =>
  hashInputs(inputsOf({ ...trial, ...change }), bytes).toString('hex')

describe('the hash of an analysis’s inputs', () => {
  it('is the same for the same inputs, in whatever order their keys stand', () => {
    const { arms, boxHeightM, externalLoadKg, protocol, side } = trial.test
    expect(hash({ test: { arms, side, boxHeightM, protocol, externalLoadKg } })).toBe(hash())
  })

  it.each([
    ['the test', hash({ test: { ...trial.test, externalLoadKg: 20 } })],
    ['the recorded mass', hash({ recordedMassKg: 72 })],
    ['no recorded mass', hash({ recordedMassKg: null })],
    ['the plates', hash({ channels: ['total'] })],
    ['a moved event', hash({ movedEvents: { takeoff: 1.5 } })],
    ['the samples', hash({}, Uint8Array.of(1, 2, 4))],
  ])('is another for %s', (_, other) => {
    expect(other).not.toBe(hash())
  })
})

describe('a trial whose events nobody moved', () => {
  it('has the hash that it had before events could be moved', () => {
    expect(hash({ movedEvents: {} })).toBe(hash())
    expect(inputsOf(trial)).not.toHaveProperty('movedEvents')
    expect(engineOptions(inputsOf(trial))).not.toHaveProperty('movedEvents')
  })
})

describe('what the engine is given', () => {
  it('names no mass where none is recorded', () => {
    expect(engineOptions(inputsOf({ ...trial, recordedMassKg: null }))).not.toHaveProperty('recordedMassKg')
  })

  it('has the moved events', () => {
    const movedEvents = { takeoff: 1.5, still: 3 }
    expect(engineOptions(inputsOf({ ...trial, movedEvents }))).toMatchObject({ movedEvents })
  })

  it('takes half a percent for each plate and standard gravity', () => {
    expect(engineOptions(inputsOf(trial))).toMatchObject({
      gravity: 9.80665,
      calibrationU: { left: 0.005, right: 0.005 },
      recordedMassKg: 71,
    })
  })
})

describe('the inputs made again with other settings, plates or place', () => {
  const changed = { changedSettings: { eventForceN: 20 }, gravity: 9.81 }
  const calibrationU = { left: 0.01, right: 0.002, single: 0.005, total: 0.005 }
  const made = inputsOf({ ...trial, movedEvents: { takeoff: 1.5 } })
  const again = remadeWith(made, trial.channels, { ...nothingKnown, ...changed, calibrationU })

  it('keep the trial’s own facts as they were taken then', () => {
    const { test, recordedMassKg, movedEvents } = made
    expect(again).toMatchObject({ test, recordedMassKg, movedEvents })
  })

  it('hold the calibration of the plates that measured, and of no other', () => {
    expect(again).toMatchObject({ gravity: 9.81, calibrationU: { left: 0.01, right: 0.002 } })
    expect(Object.keys(again.calibrationU)).toEqual(['left', 'right'])
  })

  it('give the engine its own settings with the changed ones in their place', () => {
    expect(settingsOf(again)).toEqual({ ...defaultSettings, eventForceN: 20 })
    expect(settingsOf(made)).toEqual(defaultSettings)
  })

  it('are the same where nothing was changed, so that they are the same analysis', () => {
    expect(hashInputs(remadeWith(made, trial.channels, nothingKnown), samples)).toEqual(
      hashInputs(made, samples),
    )
  })
})
