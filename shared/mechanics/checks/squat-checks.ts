import type { JumpModel } from '../metrics/trial-model.ts'
import { meanAround } from '../signal/running-mean.ts'
import type { TrialCheck } from '../types.ts'
import { check, rounded, verdictOn } from './check.ts'

/** How far the force falls under the weight between the onset and its greatest value, as a share of the weight. */
export function dipOf({ events, sums, motion, signal, settings }: JumpModel): number {
  const half = Math.max(1, Math.round(settings.onsetSmoothingS / signal.dt / 2))
  const last = Math.floor(events.takeoff.position)
  let strongest = Math.ceil(events.onset.position)
  for (let i = strongest; i <= last; i++) if (motion.force[i] > motion.force[strongest]) strongest = i
  let least = motion.systemWeight
  for (let i = Math.ceil(events.onset.position); i <= strongest; i++)
    least = Math.min(least, meanAround(sums, i, half))
  return 1 - least / motion.systemWeight
}

/** A squat jump begins upwards: a dip before it makes it another test. */
export function squatDip(model: JumpModel): TrialCheck {
  const { settings } = model
  const dip = dipOf(model)
  return check(
    'squat-dip',
    verdictOn(dip, settings.squatDipCaution, settings.squatDipFail),
    { measured: 100 * dip, limit: 100 * settings.squatDipCaution, unit: '%' },
    {
      pass: 'The push began upwards, without a dip.',
      caution: `The force fell by ${rounded(100 * dip, 1)} % of the weight before the push: a small dip.`,
      fail: `The force fell by ${rounded(100 * dip, 1)} % of the weight before the push: that is a countermovement.`,
    },
  )
}
