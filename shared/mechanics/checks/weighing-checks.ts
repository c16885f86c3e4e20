import type { AnalyseOptions, TrialCheck } from '../types.ts'
import type { Weighing } from '../events/weighing.ts'
import type { JumpModel, TrialModel } from '../metrics/trial-model.ts'
import { meanOver } from '../signal/running-mean.ts'
import { check, rounded, verdictOn } from './check.ts'

/** Where the athlete stood still to be weighed, and what to ask for where that was too short or unsteady. */
interface Stance {
  when: string
  longer: string
  steadier: string
}

const beforeJump: Stance = {
  when: 'before the jump',
  longer: 'Start recording, stand still for two seconds, then jump.',
  steadier: 'Ask the athlete to stand still for two seconds before the jump.',
}
const afterLanding: Stance = {
  when: 'after the landing',
  longer: 'Let the athlete stand still for two seconds after the landing, and record all of it.',
  steadier: 'Ask the athlete to stand still for two seconds after the landing.',
}

type Weighed = TrialModel<Weighing>

function length({ weighing, signal, settings }: Weighed, stance: Stance): TrialCheck {
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
      pass: `The athlete stood still for a second ${stance.when}.`,
      caution: `The athlete stood still for only ${rounded(duration, 2)} s ${stance.when}.`,
      fail: `The athlete stood still for only ${rounded(duration, 2)} s ${stance.when}, too short to weigh.`,
      remedy: stance.longer,
    },
  )
}

/** Half-second means within the weighing window show a weight that is still changing, spread shows unrest. */
function steadiness({ weighing, sums, settings }: Weighed, stance: Stance): TrialCheck {
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
      remedy: stance.steadier,
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

function massAgreement({ bodyMass, settings }: TrialModel, recordedMassKg: number): TrialCheck {
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

/** A load that leaves next to nothing of the weight was not carried. */
function tooMuchLoad({ bodyMass, settings, test }: TrialModel): TrialCheck {
  return check(
    'mass-agreement',
    'fail',
    { measured: bodyMass.value, limit: settings.lightestBodyKg, unit: 'kg' },
    {
      pass: '',
      fail: `Without the load of ${rounded(test.externalLoadKg, 1)} kg the athlete would weigh ${rounded(bodyMass.value, 1)} kg: the load is another one.`,
      remedy: 'Correct the external load of the test.',
    },
  )
}

function massChecks(model: TrialModel, { recordedMassKg }: AnalyseOptions): TrialCheck[] {
  const { test, bodyMass, settings } = model
  if (test.externalLoadKg > 0 && bodyMass.value < settings.lightestBodyKg) return [tooMuchLoad(model)]
  return recordedMassKg !== undefined && recordedMassKg > 0 ? [massAgreement(model, recordedMassKg)] : []
}

/** Checks of the quiet stance before a jump. */
export function weighingChecks(model: JumpModel, options: AnalyseOptions): TrialCheck[] {
  return [
    length(model, beforeJump),
    steadiness(model, beforeJump),
    stillAtOnset(model),
    ...massChecks(model, options),
  ]
}

/** No quiet stance after the landing: what needs the weight goes by the recorded mass, or is missing. */
function notWeighed({ settings, motion }: TrialModel): TrialCheck {
  const known = Number.isFinite(motion.systemWeight)
  return check(
    'weighing-length',
    known ? 'caution' : 'fail',
    { measured: 0, limit: settings.weighingWindowS, unit: 's' },
    {
      pass: '',
      caution:
        'The athlete did not stand still after the landing: the recorded mass stands in for the weighing, and the time in the air for the velocity.',
      fail: 'The athlete did not stand still after the landing, so nothing was weighed; times and forces are not affected.',
      remedy: afterLanding.longer,
    },
    ['weighing', 'jump', 'impulse', 'push', 'ledger'],
  )
}

/** Checks of the quiet stance after a landing. */
export function restChecks(model: TrialModel, options: AnalyseOptions): TrialCheck[] {
  const { weighing } = model
  if (!weighing) return [notWeighed(model)]
  const weighed = { ...model, weighing }
  return [length(weighed, afterLanding), steadiness(weighed, afterLanding), ...massChecks(model, options)]
}
