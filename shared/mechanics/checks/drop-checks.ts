import { at, type TrialModel } from '../metrics/trial-model.ts'
import type { Figure, TrialCheck } from '../types.ts'
import { check, rounded, verdictOn } from './check.ts'

/** Whether the body moved downwards at the first touch. */
function fell(model: TrialModel): boolean {
  const touch = model.events.arrival ?? model.events.touchdown
  return touch === null || at(model, touch.position).velocity < 0
}

/** The height that the athlete truly fell from against the box; made where both are known, or where nobody fell. */
export function dropHeight(model: TrialModel, effective: Figure | undefined): TrialCheck | null {
  const { settings, test } = model
  if (!effective) return null
  if (!fell(model))
    return check(
      'drop-height',
      'fail',
      { measured: null, limit: test.boxHeightM, unit: 'm' },
      { pass: '', fail: 'The body moved upwards at the first touch: weighing, zero or the record is wrong.' },
    )
  if (test.boxHeightM === null || !(test.boxHeightM > 0)) return null
  const difference = effective.value - test.boxHeightM
  const words = `The fall was that from ${rounded(100 * effective.value, 1)} cm, the box is ${rounded(100 * test.boxHeightM, 0)} cm high`
  return check(
    'drop-height',
    verdictOn(Math.abs(difference), settings.dropHeightCautionM, settings.dropHeightFailM),
    { measured: difference, limit: Math.sign(difference || 1) * settings.dropHeightCautionM, unit: 'm' },
    {
      pass: `${words}.`,
      caution: `${words}: the athlete lowered the body or jumped off.`,
      fail: `${words}: the athlete did not drop from it, or the weighing is wrong.`,
    },
  )
}

/** A drop jump has one flight after its contact. */
export function oneRebound(flights: number): TrialCheck {
  return check(
    'one-takeoff',
    flights <= 1 ? 'pass' : 'fail',
    { measured: flights, limit: 1, unit: 'flights' },
    {
      pass: 'There is one jump after the drop.',
      fail: `There are ${flights} flights after the drop; the figures are those of the first.`,
      remedy: 'Jump once after the drop and stand still after the landing, or set this trial aside.',
    },
  )
}

/** A landing from a box has no flight after it. */
export function noJump(flights: number): TrialCheck {
  return check(
    'one-takeoff',
    flights === 0 ? 'pass' : 'fail',
    { measured: flights, limit: 0, unit: 'flights' },
    {
      pass: 'The athlete stayed on the plates after the landing.',
      fail: 'The athlete left the plates again after the landing: that is a drop jump.',
      remedy: 'Land and stand still, or name the test a drop jump.',
    },
  )
}

/** A rebound is short, and a jump that a body can reach. */
export function plausibleRebound(
  { settings }: TrialModel,
  contactS: number,
  heightM: number | null,
): TrialCheck {
  const long = !(contactS <= settings.longestReboundS)
  const high = heightM !== null && !(heightM >= settings.lowestJumpM && heightM <= settings.highestJumpM)
  return check(
    'plausible-rebound',
    long || high ? 'fail' : 'pass',
    { measured: contactS, limit: settings.longestReboundS, unit: 's' },
    {
      pass: 'The trace is that of a drop jump.',
      fail: long
        ? `The feet were on the ground for ${rounded(contactS, 2)} s: that is a landing and a jump from there.`
        : `A jump height of ${rounded(100 * (heightM ?? 0), 1)} cm is outside what a jump can reach.`,
    },
  )
}
