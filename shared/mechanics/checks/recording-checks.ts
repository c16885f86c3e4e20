import type { Recording, TrialCheck } from '../types.ts'
import type { Unloaded } from '../events/unloaded.ts'
import type { Zero, ZeroedSignal } from '../events/zero.ts'
import type { Settings } from '../settings.ts'
import type { Signal } from '../signal/condition.ts'
import { check, rounded, verdictOn } from './check.ts'

function sampleRate(signal: Signal, settings: Settings): TrialCheck {
  const rate = signal.sampleRateHz
  const verdict =
    rate < settings.poorestSampleRateHz ? 'fail' : rate < settings.lowestSampleRateHz ? 'caution' : 'pass'
  return check(
    'sample-rate',
    verdict,
    { measured: rate, limit: settings.lowestSampleRateHz, unit: 'Hz' },
    {
      pass: `Force was sampled ${rounded(rate, 0)} times a second.`,
      caution: `Force was sampled only ${rounded(rate, 0)} times a second; short events are timed coarsely.`,
      fail: `Force was sampled only ${rounded(rate, 0)} times a second, too few for a jump.`,
    },
  )
}

function timeBase(recording: Recording, settings: Settings): TrialCheck {
  const error = recording.timeBaseError
  return check(
    'time-base',
    verdictOn(error, settings.timeBaseLimit, settings.timeBaseFail),
    { measured: error, limit: settings.timeBaseLimit, unit: 'sample intervals' },
    {
      pass: 'The time stamps are even.',
      caution: `A time stamp lies ${rounded(error, 2)} of a sample interval off the even time base.`,
      fail: 'The time stamps are uneven: samples were lost or doubled.',
    },
  )
}

function gaps(recording: Recording, signal: Signal, settings: Settings): TrialCheck {
  const filled = recording.filledSamples + signal.unreadable
  const share = filled / signal.length
  return check(
    'gaps',
    verdictOn(share, 0, settings.filledLimit),
    { measured: filled, limit: Math.floor(settings.filledLimit * signal.length), unit: 'samples' },
    {
      pass: 'No sample is missing.',
      caution: `There are ${filled} samples that could not be read; they were bridged by straight lines.`,
      fail: `There are ${filled} samples that could not be read, too many to bridge.`,
    },
  )
}

function saturation(signal: Signal, settings: Settings): TrialCheck {
  // A plate that never changes has no range to leave; whether it should, another check says.
  const longest = Math.max(0, ...signal.plates.filter(({ dead }) => !dead).map(({ flatTop }) => flatTop))
  const limit = settings.saturationSamples
  return check(
    'saturation',
    longest < limit ? 'pass' : 'fail',
    { measured: longest, limit, unit: 'samples' },
    {
      pass: 'The force stays within the range of the plates.',
      fail: `The force stays at its greatest value for ${longest} samples: the plate's range was exceeded.`,
    },
  )
}

/** Whether the plates were set to zero with the athlete on them: loaded reads nothing, unloaded reads minus the weight. */
export function taredWithAthlete({ level, stanceLevel }: Unloaded, settings: Settings): boolean {
  return Math.abs(stanceLevel) < settings.zeroShare * (stanceLevel - level)
}

function zeroOffset(signal: ZeroedSignal, unloaded: Unloaded, settings: Settings): TrialCheck {
  const tared = taredWithAthlete(unloaded, settings)
  const largest = signal.plates.reduce((most, { offsetN }) => Math.max(most, Math.abs(offsetN)), 0)
  const verdict = tared
    ? 'caution'
    : verdictOn(largest, settings.zeroOffsetCautionN, settings.zeroOffsetFailN)
  return check(
    'zero-offset',
    verdict,
    { measured: largest, limit: settings.zeroOffsetCautionN, unit: 'N' },
    {
      pass: `The empty plates read within ${rounded(largest, 1)} N of zero; corrected.`,
      caution: tared
        ? 'The plates were set to zero with the athlete on them; corrected from the flight.'
        : `The empty plates read ${rounded(largest, 1)} N off zero; corrected.`,
      fail: `The empty plates read ${rounded(largest, 1)} N off zero, more than a drift explains.`,
    },
  )
}

function plateNoise(zero: Zero, settings: Settings): TrialCheck {
  const sd = zero.total.sd
  return check(
    'noise',
    verdictOn(sd, settings.noiseCautionN, settings.noiseFailN),
    { measured: sd, limit: settings.noiseCautionN, unit: 'N' },
    {
      pass: `The empty plates waver by ${rounded(sd, 1)} N.`,
      caution: `The empty plates waver by ${rounded(sd, 1)} N; every figure is less sure.`,
      fail: `The empty plates waver by ${rounded(sd, 1)} N, too much to measure a jump.`,
    },
  )
}

function polarity(signal: Signal): TrialCheck {
  const turned = signal.plates.filter(({ flipped }) => flipped).length
  return check(
    'polarity',
    turned === 0 ? 'pass' : 'caution',
    { measured: turned, limit: 0, unit: 'plates' },
    {
      pass: 'Pressing down reads positive.',
      caution: 'Pressing down read negative; the sign was reversed.',
    },
  )
}

/** Checks of the recording as such. */
export function recordingChecks(
  recording: Recording,
  signal: ZeroedSignal,
  unloaded: Unloaded,
  zero: Zero,
  settings: Settings,
): TrialCheck[] {
  return [
    sampleRate(signal, settings),
    timeBase(recording, settings),
    gaps(recording, signal, settings),
    saturation(signal, settings),
    polarity(signal),
    zeroOffset(signal, unloaded, settings),
    plateNoise(zero, settings),
  ]
}
