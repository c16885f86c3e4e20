import { usualTest } from '../../shared/contracts/session-test.ts'
import type { Test } from '../../shared/contracts/tests.ts'
import type { GivenAttempt } from '../synthetic/attempts.ts'
import { seededRandom, type Random } from '../synthetic/random.ts'
import { type Athlete, type AttemptsRecipe, plateOf } from './stories.ts'

/** A session of another test than the monthly jumps; invented like all of the demo club. */
export interface OtherSession {
  squad: number
  title: string
  test: Test
  /** Days before the squad's latest session: between the monthly jumps of two and of one month ago. */
  daysBefore: number
}

const drop = { boxHeightM: 0.3 }

export const otherSessions: readonly OtherSession[] = [
  { squad: 0, title: 'drop jumps', test: { ...usualTest('dj'), ...drop }, daysBefore: 38 },
  { squad: 0, title: 'hops', test: usualTest('hops'), daysBefore: 45 },
  { squad: 1, title: 'left leg', test: { ...usualTest('slcmj'), side: 'left' }, daysBefore: 40 },
  { squad: 1, title: 'right leg', test: { ...usualTest('slcmj'), side: 'right' }, daysBefore: 40 },
  { squad: 2, title: 'drop landings', test: { ...usualTest('dropLanding'), ...drop }, daysBefore: 42 },
  { squad: 2, title: 'squat jumps', test: usualTest('sj'), daysBefore: 48 },
]

/** So many of a squad come to such a session, and do the test twice into one file. */
export const cameToOther = 8

/** Two attempts of an athlete at a test, in one recording; between them they step off the plates. */
export function attemptsOf(athlete: Athlete, test: Test, seed: number): AttemptsRecipe {
  const random = seededRandom(seed)
  const body = {
    swayVelocity: 0.002,
    heartbeatN: random.between(2, 5),
    heartRateHz: random.between(1, 1.5),
    fidgetN: 0,
  }
  const first = { ...attemptOf(athlete, test, random), leavesForS: 3, settleS: 2 }
  return {
    athlete: { massKg: athlete.massKg, body },
    attempts: [first, attemptOf(athlete, test, random)],
    plates: { left: plateOf(1, null), right: plateOf(-1, null) },
    seed,
  }
}

function attemptOf({ velocity, style, leftShare }: Athlete, test: Test, random: Random): GivenAttempt {
  const around = (value: number, share: number) => value * (1 + random.normal() * share)
  const share = leftShare + random.normal() * 0.01
  const shares = { stance: share, unweighting: share, braking: share, propulsion: share, landing: share }
  const landed = { shares, landingS: around(style.landingS, 0.04) }
  const fallen = { ...drop, dropHeightM: around(0.29, 0.03) }
  const leaves = (part: number) => around(velocity * part, 0.015)
  switch (test.protocol) {
    case 'dj': {
      const contact = { takeoffVelocity: leaves(0.92), contactS: around(0.21, 0.04) }
      return { protocol: 'dj', ...landed, ...fallen, ...contact }
    }
    case 'hops': {
      const contact = 'spring'
      const hop = () => ({ contact, contactS: around(0.19, 0.03), takeoffVelocity: leaves(0.82) }) as const
      const contacts = Array.from({ length: 10 }, hop)
      return { protocol: 'hops', ...landed, takeoffVelocity: leaves(0.82), contacts }
    }
    case 'dropLanding':
      return { protocol: 'dropLanding', ...landed, ...fallen }
    case 'sj':
      return { protocol: 'sj', ...landed, takeoffVelocity: leaves(0.95) }
    case 'slcmj':
    case 'cmj': {
      const { protocol, side } = test
      return { protocol, side, ...landed, takeoffVelocity: leaves(side === 'both' ? 1 : 0.68) }
    }
  }
}
