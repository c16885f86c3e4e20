import { describe, expect, it } from 'vitest'
import { standardGravity } from '../../shared/units/gravity.ts'
import { analyse } from '../../shared/mechanics/analyse.ts'
import type { Test } from '../../shared/mechanics/types.ts'
import { coverageTrial } from './coverage-trials.ts'

const test: Test = { protocol: 'cmj', side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips' }

describe('a push without a dip, read as a countermovement jump', () => {
  // Synthetic squat jumps in which noise alone makes velocity dip below zero for a moment.
  it.each([94, 124, 245, 247, 358])(
    'has no braking to speak of, and still a takeoff (trial %i)',
    (number) => {
      const { recording } = coverageTrial('sj', number)
      const [trial] = analyse(recording, { test, gravity: standardGravity, calibrationU: {} }).trials
      expect(trial.metrics.takeoffVelocity.value).toBeGreaterThan(1)
      expect(trial.events.minimumVelocity).toBeUndefined()
      expect(trial.missing.map(({ key }) => key)).toContain('peakBrakingPower')
    },
  )
})
