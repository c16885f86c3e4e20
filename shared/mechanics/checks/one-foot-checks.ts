import type { JumpModel, PlateInputs } from '../metrics/trial-model.ts'
import type { TrialInput } from '../protocols/protocol.ts'
import { meanAround } from '../signal/running-mean.ts'
import type { TrialCheck } from '../types.ts'
import { check, rounded, verdictOn } from './check.ts'

/** Greatest force on a plate, over a short running mean, between two positions. */
function greatestOn({ sums }: PlateInputs, model: JumpModel, from: number, to: number): number {
  const { signal, settings } = model
  const half = Math.max(1, Math.round(settings.onsetSmoothingS / signal.dt / 2))
  let greatest = 0
  for (let i = Math.max(0, Math.ceil(from)); i <= Math.min(signal.length - 1, to); i++)
    greatest = Math.max(greatest, meanAround(sums, i, half))
  return greatest
}

function otherFootOff(model: JumpModel, other: PlateInputs): TrialCheck {
  const { weighing, events, motion, settings } = model
  const load = greatestOn(other, model, weighing.window.from, events.takeoff.position) / motion.systemWeight
  return check(
    'other-foot-off',
    verdictOn(load, settings.otherFootCaution, settings.otherFootFail),
    { measured: 100 * load, limit: 100 * settings.otherFootCaution, unit: '%' },
    {
      pass: 'The other foot stayed off its plate up to takeoff.',
      caution: `The other foot touched its plate with up to ${rounded(100 * load, 0)} % of the weight before takeoff.`,
      fail: `The other foot pushed on its plate with up to ${rounded(100 * load, 0)} % of the weight before takeoff.`,
    },
  )
}

/** Landing on both feet leaves the jump standing; the landing is then not that of one leg. */
function landsOnOne(model: JumpModel, other: PlateInputs): TrialCheck | null {
  const { events, motion, settings } = model
  const { touchdown, landingZeroVelocity } = events
  if (!touchdown || landingZeroVelocity === null) return null
  const load = greatestOn(other, model, touchdown.position, landingZeroVelocity) / motion.systemWeight
  return check(
    'other-foot-landing',
    verdictOn(load, settings.otherFootCaution, settings.otherFootFail),
    { measured: 100 * load, limit: 100 * settings.otherFootCaution, unit: '%' },
    {
      pass: 'The landing was on one foot.',
      caution: `The other foot touched its plate with up to ${rounded(100 * load, 0)} % of the weight in the landing.`,
      fail: `The other foot took up to ${rounded(100 * load, 0)} % of the weight in the landing: both feet landed.`,
    },
  )
}

/** A test that was named is on the named leg; one that was not may be of two feet, one of them beside its plate. */
function sideAgrees({ test }: JumpModel, standing: PlateInputs, proposed: boolean): TrialCheck | null {
  if (test.side === 'both') return null
  const agrees = standing.channel === test.side
  return check(
    'side-agreement',
    agrees && !proposed ? 'pass' : 'fail',
    { measured: agrees ? 1 : 0, limit: 1, unit: 'side' },
    {
      pass: `The athlete stood on the ${test.side} plate.`,
      fail: agrees
        ? 'Only one plate was loaded and no test was named: a jump on one leg, or a foot beside its plate.'
        : `The test is of the ${test.side} leg, and the athlete stood on the ${standing.channel} plate.`,
      ...(agrees ? { remedy: 'Name the test and the leg.' } : {}),
    },
  )
}

/** The plate that the athlete stood on first, then the other; `null` with one plate. */
function standingFirst({ plates }: JumpModel): [PlateInputs, PlateInputs] | null {
  const [a, b] = plates
  if (!a || !b) return null
  return a.stanceForce >= b.stanceForce ? [a, b] : [b, a]
}

/** Checks of a jump on one leg where there are two plates. */
export function oneFootChecks(model: JumpModel, { options }: TrialInput): TrialCheck[] {
  const plates = standingFirst(model)
  if (!plates) return []
  const [standing, other] = plates
  return [
    sideAgrees(model, standing, options.test === undefined),
    otherFootOff(model, other),
    landsOnOne(model, other),
  ].filter((entry) => entry !== null)
}
