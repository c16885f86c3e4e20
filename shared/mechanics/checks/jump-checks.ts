import type { Ledger, TrialCheck } from '../types.ts'
import type { Unloaded } from '../events/unloaded.ts'
import type { JumpModel, TrialModel } from '../metrics/trial-model.ts'
import { check, rounded, verdictOn } from './check.ts'

/** What the checks of the jump need beside the model. */
export interface JumpReadings {
  unloaded: Unloaded
  heightImpulseM: number
  heightFlightM: number | null
  ledger: Ledger
  /** Whether the push begins with a countermovement. */
  dips: boolean
}

function oneTakeoff({ unloaded }: JumpReadings): TrialCheck {
  const count = unloaded.flights.length
  return check(
    'one-takeoff',
    count <= 1 ? 'pass' : 'fail',
    { measured: count, limit: 1, unit: 'flights' },
    {
      pass: 'There is one jump in the recording.',
      fail: `There are ${count} flights in the recording; the figures are those of the first.`,
    },
  )
}

function plausible({ settings, events }: JumpModel, { heightImpulseM, dips }: JumpReadings): TrialCheck {
  const low = settings.lowestJumpM
  const high = settings.highestJumpM
  const dip = !dips || (events.minimumVelocity !== null && events.zeroVelocity !== null)
  const ok = heightImpulseM >= low && heightImpulseM <= high && dip
  return check(
    'plausible-jump',
    ok ? 'pass' : 'fail',
    { measured: heightImpulseM, limit: heightImpulseM < low ? low : high, unit: 'm' },
    {
      pass: 'The trace is that of a jump from stance.',
      fail: dip
        ? `A jump height of ${rounded(100 * heightImpulseM, 1)} cm is outside what a standing jump can reach.`
        : 'No countermovement was found before the push.',
    },
  )
}

export function heightAgreement(
  { settings }: TrialModel,
  readings: Pick<JumpReadings, 'heightImpulseM' | 'heightFlightM'>,
): TrialCheck | null {
  const { heightImpulseM, heightFlightM } = readings
  if (heightFlightM === null) return null
  const difference = heightFlightM - heightImpulseM
  const ok = difference <= settings.heightAgreementM && difference >= -settings.heightNegativeM
  const far = difference > settings.heightAgreementFailM || difference < -settings.heightNegativeFailM
  return check(
    'height-agreement',
    ok ? 'pass' : far ? 'fail' : 'caution',
    {
      measured: difference,
      limit: difference < 0 ? -settings.heightNegativeM : settings.heightAgreementM,
      unit: 'm',
    },
    {
      pass: 'Height by impulse and height by flight time agree.',
      caution: `Height by flight time differs from height by impulse by ${rounded(100 * difference, 1)} cm.`,
      fail: `Height by flight time differs from height by impulse by ${rounded(100 * difference, 1)} cm: one of them is wrong.`,
    },
    difference > 0 && !far ? ['flight'] : ['jump', 'impulse', 'push', 'flight', 'landing', 'ledger'],
  )
}

export function closing(
  { motion, settings }: TrialModel,
  { ledger }: Pick<JumpReadings, 'ledger'>,
): TrialCheck {
  const testable = ledger.closing.closes !== null || ledger.closing.U !== null
  const mass = motion.systemWeight / motion.gravity
  const speed = Math.abs(ledger.closing.value) / mass
  if (!testable)
    return check(
      'closing-balance',
      'caution',
      { measured: null, limit: settings.closingCaution, unit: 'm/s' },
      {
        pass: '',
        caution:
          'The closing balance cannot be tested: the athlete did not stand still for a second after landing.',
        remedy: 'Let the recording run until the athlete has stood still for a second.',
      },
      ['ledger'],
    )
  return check(
    'closing-balance',
    verdictOn(speed, settings.closingCaution, settings.closingFail),
    { measured: speed, limit: settings.closingCaution, unit: 'm/s' },
    {
      pass: `The momentum account closes to ${rounded(speed, 3)} m/s.`,
      caution: `The momentum account is ${rounded(speed, 3)} m/s off at the end.`,
      fail: `The momentum account is ${rounded(speed, 3)} m/s off at the end: weighing, zero or the record is wrong.`,
    },
  )
}

export function landedOnPlates({ events }: TrialModel): TrialCheck {
  return check(
    'landing-on-plates',
    events.touchdown ? 'pass' : 'fail',
    { measured: events.touchdown ? 1 : 0, limit: 1, unit: 'touchdown' },
    {
      pass: 'The athlete came down on the plates.',
      fail: 'No landing on the plates was found after the takeoff.',
    },
  )
}

export function landingLength({ events, signal, settings }: TrialModel, mayGoOn = false): TrialCheck | null {
  if (!events.touchdown) return null
  const unsure = mayGoOn && events.still === null
  const left = (signal.length - 1 - events.touchdown.position) * signal.dt
  const verdict =
    events.landingZeroVelocity === null || unsure
      ? 'fail'
      : left < settings.landingLengthS
        ? 'caution'
        : 'pass'
  return check(
    'landing-length',
    verdict,
    { measured: left, limit: settings.landingLengthS, unit: 's' },
    {
      pass: 'The recording goes on long enough after touchdown.',
      caution: `The recording ends ${rounded(left, 2)} s after touchdown.`,
      fail: unsure
        ? 'The recording ends before the athlete stood still: the last contact may be another hop.'
        : `The recording ends ${rounded(left, 2)} s after touchdown, before the fall was stopped.`,
    },
  )
}

export function plausibleLanding({ events, motion, settings }: TrialModel): TrialCheck | null {
  if (!events.landingPeak || !(motion.systemWeight > 0)) return null
  const bodyWeights = events.landingPeak.value / motion.systemWeight
  const ok = bodyWeights > settings.lowestLandingPeak
  return check(
    'plausible-landing',
    ok ? 'pass' : 'fail',
    { measured: bodyWeights, limit: settings.lowestLandingPeak, unit: 'BW' },
    {
      pass: 'The landing force is that of a landing.',
      fail: `The landing force reaches only ${rounded(bodyWeights, 2)} times the weight, too little to stop a fall.`,
    },
  )
}

/** Checks of jump and landing. */
export function jumpChecks(model: JumpModel, readings: JumpReadings): TrialCheck[] {
  return [
    oneTakeoff(readings),
    plausible(model, readings),
    heightAgreement(model, readings),
    landedOnPlates(model),
    landingLength(model),
    plausibleLanding(model),
    closing(model, readings),
  ].filter((entry) => entry !== null)
}
