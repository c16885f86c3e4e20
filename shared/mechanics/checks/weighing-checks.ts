import type { AnalyseOptions, TrialCheck } from '../types.ts'
import type { JumpModel } from '../metrics/jump-model.ts'
import { meanOver } from '../signal/running-mean.ts'
import { check, rounded, verdictOn } from './check.ts'

function length({ weighing, signal, settings }: JumpModel): TrialCheck {
  const duration = (weighing.window.to - weighing.window.from) * signal.dt
  const verdict =
    duration >= 0.999 * settings.weighingWindowS
      ? 'pass'
      : duration >= settings.weighingFailS
        ? 'caution'
        : 'fail'
  return check(
    'weighing-length',
    verdict,
    { measured: duration, limit: settings.weighingWindowS, unit: 's' },
    {
      pass: 'The athlete stood still for a second before the jump.',
      caution: `The athlete stood still for only ${rounded(duration, 2)} s before the jump.`,
      fail: `The athlete stood still for only ${rounded(duration, 2)} s before the jump, too short to weigh.`,
    },
  )
}

/** Half-second means within the weighing window show a weight that is still changing, spread shows unrest. */
function steadiness({ weighing, sums, settings }: JumpModel): TrialCheck {
  const { from, to } = weighing.window
  const middle = (from + to) >> 1
  const change = Math.abs(meanOver(sums, middle, to) - meanOver(sums, from, middle))
  const unrest = Math.max(weighing.spread, change) / weighing.systemWeight
  return check(
    'weighing-steadiness',
    verdictOn(unrest, settings.steadinessCaution, settings.steadinessFail),
    { measured: 100 * unrest, limit: 100 * settings.steadinessCaution, unit: '%' },
    {
      pass: `The force wavers by ${rounded(100 * unrest, 1)} % of the weight during the weighing.`,
      caution: `The force wavers by ${rounded(100 * unrest, 1)} % of the weight during the weighing; the weight is less sure.`,
      fail: `The force wavers by ${rounded(100 * unrest, 1)} % of the weight during the weighing: the athlete did not stand still.`,
    },
  )
}

/** Speed that the body picked up between the middle of the weighing and the onset. */
function stillAtOnset({ weighing, sums, events, motion, signal, settings }: JumpModel): TrialCheck {
  const middle = (weighing.window.from + weighing.window.to) >> 1
  const onset = Math.floor(events.onset.position)
  const mean = meanOver(sums, middle, onset)
  const impulse = onset > middle ? (mean - weighing.systemWeight) * (onset - middle) * signal.dt : 0
  const speed = Math.abs((impulse * motion.gravity) / motion.systemWeight)
  const verdict = events.onset.fromQuiet
    ? verdictOn(speed, settings.onsetVelocityCaution, settings.onsetVelocityFail)
    : 'fail'
  return check(
    'still-at-onset',
    verdict,
    { measured: speed, limit: settings.onsetVelocityCaution, unit: 'm/s' },
    {
      pass: 'The athlete was still when the movement began.',
      caution: `The body moved at some ${rounded(speed, 3)} m/s when the movement began.`,
      fail: events.onset.fromQuiet
        ? `The body already moved at ${rounded(speed, 3)} m/s when the movement began.`
        : 'No quiet stance was found right before the movement.',
    },
  )
}

function massAgreement({ bodyMass, settings }: JumpModel, recordedMassKg: number): TrialCheck {
  const difference = bodyMass.value / recordedMassKg - 1
  return check(
    'mass-agreement',
    verdictOn(Math.abs(difference), settings.massCaution, settings.massFail),
    { measured: 100 * difference, limit: 100 * settings.massCaution, unit: '%' },
    {
      pass: `The plates weigh ${rounded(bodyMass.value, 1)} kg, which agrees with the recorded mass.`,
      caution: `The plates weigh ${rounded(bodyMass.value, 1)} kg, the athlete's record says ${rounded(recordedMassKg, 1)} kg.`,
      fail: `The plates weigh ${rounded(bodyMass.value, 1)} kg, the athlete's record says ${rounded(recordedMassKg, 1)} kg: perhaps another athlete.`,
    },
  )
}

/** Checks of the quiet stance. */
export function weighingChecks(model: JumpModel, options: AnalyseOptions): TrialCheck[] {
  const { recordedMassKg } = options
  const checks = [length(model), steadiness(model), stillAtOnset(model)]
  if (recordedMassKg !== undefined && recordedMassKg > 0) checks.push(massAgreement(model, recordedMassKg))
  return checks
}
