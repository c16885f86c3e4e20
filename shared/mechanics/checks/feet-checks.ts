import type { TrialCheck } from '../types.ts'
import type { Foot } from '../metrics/sides.ts'
import type { TrialModel } from '../metrics/trial-model.ts'
import { allGroups } from './affected-groups.ts'
import { check, rounded } from './check.ts'

/** Longest run, in samples, in which a foot is off its plate within [from, to) while the other is loaded. */
function longestOff(foot: Foot, model: TrialModel, from: number, to: number): number {
  const { settings, motion } = model
  const threshold = Math.max(2 * settings.eventForceN, settings.unloadedSd * foot.noise.sd)
  const { force } = foot.plate
  const total = motion.force
  const end = Math.min(force.length, to)
  const isOff = (i: number) => force[i] < threshold && total[i] > 4 * threshold
  let longest = 0
  for (let i = Math.max(0, Math.ceil(from)); i < end; i++) {
    if (!(force[i] < threshold)) continue
    const since = i
    while (i < end && isOff(i)) i++
    longest = Math.max(longest, i - since)
  }
  return longest
}

/** Both feet carry a fair part of the weight while the athlete stands, and stay on through the push. */
function bothOn(model: TrialModel, feet: [Foot, Foot]): TrialCheck | null {
  const { settings, motion, signal, weighing, events } = model
  if (!weighing) return null
  const touch = events.arrival ?? events.touchdown
  const from = events.onset || !touch ? weighing.window.from : touch.position
  const to = (events.takeoff ?? touch)?.position ?? from
  const share = Math.min(...feet.map(({ plate }) => plate.stanceForce)) / motion.systemWeight
  const limitS = settings.footOffLandingS
  const off = Math.max(...feet.map((foot) => longestOff(foot, model, from, to))) * signal.dt
  const fail = share < settings.footShareFail || off > limitS
  return check(
    'both-feet',
    fail ? 'fail' : share < settings.footShareCaution ? 'caution' : 'pass',
    { measured: 100 * share, limit: 100 * settings.footShareCaution, unit: '%' },
    {
      pass: `The lighter foot carries ${rounded(100 * share, 0)} % of the weight in stance.`,
      caution: `The lighter foot carries only ${rounded(100 * share, 0)} % of the weight in stance.`,
      fail:
        share < settings.footShareFail
          ? `One plate carries only ${rounded(100 * share, 0)} % of the weight: a foot stands beside it.`
          : `A foot was off its plate for ${rounded(1000 * off, 0)} ms before takeoff.`,
    },
    fail ? allGroups : ['sides'],
  )
}

/** After both have touched down, no foot leaves its plate until the fall is stopped and the athlete stands. */
function offInLanding(model: TrialModel, feet: [Foot, Foot]): TrialCheck | null {
  const { events, signal, settings } = model
  if (!events.touchdown) return null
  const latest = Math.max(events.touchdown.position, ...feet.map(({ touchdown }) => touchdown?.position ?? 0))
  const end = events.still ?? events.landingZeroVelocity ?? signal.length
  const off = Math.max(...feet.map((foot) => longestOff(foot, model, latest, end))) * signal.dt
  const absent = feet.some(({ touchdown }) => touchdown === null)
  return check(
    'foot-off-landing',
    absent || off > settings.footOffLandingS ? 'fail' : 'pass',
    { measured: off, limit: settings.footOffLandingS, unit: 's' },
    {
      pass: 'Both feet stayed on the plates after touchdown.',
      fail: absent
        ? 'One foot did not come down on its plate.'
        : `A foot was off its plate for ${rounded(off, 2)} s during the landing.`,
    },
  )
}

/** Checks that need two plates. */
export function feetChecks(model: TrialModel, feet: [Foot, Foot]): TrialCheck[] {
  return [bothOn(model, feet), offInLanding(model, feet)].filter((entry) => entry !== null)
}

/** A plate whose force never changes: not connected, or nobody on it. */
export function deadPlates({ signal }: TrialModel): TrialCheck {
  const dead = signal.plates.filter((plate) => plate.dead).map(({ channel }) => channel)
  return check(
    'plate-alive',
    dead.length === 0 ? 'pass' : 'fail',
    { measured: dead.length, limit: 0, unit: 'plates' },
    {
      pass: 'Every plate reads a changing force.',
      fail: `The ${dead.join(' and ')} plate reads the same force throughout: it is not connected, or nobody stood on it.`,
    },
  )
}
