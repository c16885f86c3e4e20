import { syntheticProtocols } from '../../seed/synthetic/attempts.ts'
import type { GivenAttempt, SyntheticProtocol } from '../../seed/synthetic/attempts.ts'
import { systemKg } from '../../seed/synthetic/options.ts'
import type { Athlete } from '../../seed/synthetic/options.ts'
import { perform } from '../../seed/synthetic/perform.ts'
import type { Trial } from '../../seed/synthetic/perform.ts'
import { seededRandom } from '../../seed/synthetic/random.ts'
import type { Random } from '../../seed/synthetic/random.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import type { Recording } from '../../shared/mechanics/types.ts'
import { drawAttempt } from './coverage-attempts.ts'
import { drawBody, drawGain, drawPlate, gravity, masses, noises } from './coverage-draws.ts'
import type { Noise } from './coverage-draws.ts'

const rates = [500, 1000, 2000] as const
/** Share of trials in which the recording holds a second one. */
const ACCOMPANIED = 0.15
/** Share of countermovement jumps with a load. */
const LOADED = 0.2

/** One drawn trial: what truly happened, what the plates wrote, and where it belongs. */
export interface CoverageTrial {
  trial: Trial
  recording: Recording
  /** The trial's clock at the recording's first sample, s. */
  startS: number
  /** By kind: rate, noise, mass, plates, shapes. */
  strata: Record<string, string>
}

function drawAthlete(
  protocol: SyntheticProtocol,
  noise: Noise,
  random: Random,
): { athlete: Athlete; strata: Record<string, string> } {
  const mass = random.pick(['light', 'middle', 'heavy'] as const)
  const isLoaded = protocol === 'cmj' && random.next() < LOADED
  const athlete: Athlete = {
    massKg: random.between(masses[mass].from, masses[mass].to),
    loadKg: isLoaded ? 2.5 * Math.round(random.between(4, 24)) : 0,
    gravity,
    body: drawBody(noise, random),
  }
  return { athlete, strata: protocol === 'cmj' ? { mass, load: isLoaded ? 'some' : 'none' } : { mass } }
}

/** Two attempts in a row, between which the athlete stays in quiet stance or leaves the plates. */
function accompany(
  attempt: GivenAttempt,
  other: GivenAttempt,
  isSecond: boolean,
  random: Random,
): GivenAttempt[] {
  const [first, second] = isSecond ? [other, attempt] : [attempt, other]
  const fromBox = second.protocol === 'dj' || second.protocol === 'dropLanding'
  const leaves = fromBox || random.next() < 0.5
  return [leaves ? { ...first, leavesForS: random.between(2, 4) } : first, second]
}

/**
 * The trial of a number: always the same one.
 * @param mayBeAccompanied whether some recordings hold two trials, of which this is one
 */
export function coverageTrial(
  protocol: SyntheticProtocol,
  number: number,
  mayBeAccompanied = false,
): CoverageTrial {
  const random = seededRandom(100_000 * (syntheticProtocols.indexOf(protocol) + 1) + number)
  const rate = random.pick(rates)
  const noise = random.pick(noises)
  const plates = random.pick([1, 2, 2, 'total'] as const)
  const { athlete, strata } = drawAthlete(protocol, noise, random)
  const slower = Math.sqrt(athlete.massKg / systemKg(athlete))
  const { attempt, shape } = drawAttempt(protocol, random, slower)
  const isAccompanied = mayBeAccompanied && random.next() < ACCOMPANIED
  const isSecond = isAccompanied && random.next() < 0.5
  const attempts = isAccompanied
    ? accompany(attempt, drawAttempt(protocol, random, slower).attempt, isSecond, random)
    : [attempt]
  const performance = perform(athlete, attempts, number)
  const trial = performance.trials[isSecond ? 1 : 0]
  if (!trial) throw new RangeError('An attempt makes a trial.')
  // Any phase of the sample clock against the body's.
  const startS = random.between(0, 1 / rate)
  const gainError = drawGain(random)
  const otherGain = plates === 'total' ? gainError : drawGain(random)
  const recording = recordJump(
    performance,
    { sampleRateHz: rate, startS, durationS: performance.endS - startS, plates },
    { left: drawPlate(noise, gainError, random), right: drawPlate(noise, otherGain, random) },
    number,
  )
  const together: Record<string, string> = mayBeAccompanied
    ? { recording: isAccompanied ? 'two trials' : 'one trial' }
    : {}
  return {
    trial,
    recording,
    startS,
    strata: { rate: `${rate} Hz`, noise, plates: `${plates}`, ...strata, ...shape, ...together },
  }
}

/**
 * A countermovement jump in a clean laboratory: a still athlete on two plates with 3 N of white noise each, 8 s at
 * 1,000 Hz. The takeoff velocity is then as good as noise and weighing allow.
 */
export function laboratoryTrial(number: number): CoverageTrial {
  const random = seededRandom(900_000 + number)
  const athlete = { massKg: random.between(50, 110), gravity }
  const { attempt, shape } = drawAttempt('cmj', random)
  const stanceS = random.between(1.5, 1.8)
  const [trial] = perform(athlete, [{ ...attempt, stanceS }], number).trials
  if (!trial) throw new RangeError('An attempt makes a trial.')
  const plate = { whiteNoiseN: 3 }
  const sampling = { sampleRateHz: 1000, durationS: 8 }
  const recording = recordJump(trial, sampling, { left: plate, right: plate }, number)
  return { trial, recording, startS: 0, strata: { noise: 'laboratory', ...shape } }
}
