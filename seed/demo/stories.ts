import type { GivenAttempt } from '../synthetic/attempts.ts'
import type { JumpOptions, LeftShares, PlateOptions } from '../synthetic/options.ts'
import { seededRandom, type Random } from '../synthetic/random.ts'

/** How one athlete jumps, and what becomes of it over the months. */
export interface Athlete {
  name: string
  seed: number
  massKg: number
  /** m/s at takeoff in the first month. */
  velocity: number
  /** What training does to it, m/s a month. */
  gain: number
  style: Pick<JumpOptions, 'depthM' | 'unweightingS' | 'pushS' | 'landingS' | 'push' | 'landing'>
  leftShare: number
  /** Index of the month of an injury; away for two months, back with less and on the other leg. */
  injuredIn: number | null
}

const risers = new Set([
  'Mara Ostrow',
  'Kofi Ansemba',
  'Noor Elbadrin',
  'Marek Zielonka',
  'Imke Sandvoort',
  'Nia Pembertree',
])
const injured: Record<string, number> = { 'Tomi Halvarden': 6, 'Thandi Mkhondo': 8 }
/** Lands hard, with straight knees. */
const hardLanders = new Set(['Callum Brackwith', 'Owen Tredinnock', 'Gus Wetherlam'])

export function describeAthlete(name: string, seed: number): Athlete {
  const random = seededRandom(seed * 7919 + 11)
  const hard = hardLanders.has(name)
  const velocity = random.between(2.1, 2.85)
  return {
    name,
    seed,
    massKg: Math.round(random.between(53, 96) * 10) / 10,
    velocity,
    gain: risers.has(name) ? random.between(0.018, 0.026) : random.between(-0.002, 0.004),
    style: {
      depthM: random.between(0.26, 0.38),
      unweightingS: random.between(0.36, 0.46),
      pushS: random.between(0.34, 0.42),
      landingS: hard ? random.between(0.17, 0.19) : random.between(0.24, 0.32),
      push: random.pick(['even', 'early', 'late', 'twoHumps'] as const),
      // From high up on stiff legs the forefoot's peak and the heel's run together.
      landing: hard || velocity > 2.6 ? 'onePeak' : random.pick(['onePeak', 'twoPeaks'] as const),
    },
    leftShare: random.between(0.47, 0.53),
    injuredIn: injured[name] ?? null,
  }
}

/** Two months away after the month of the injury. */
export function isAway({ injuredIn }: Athlete, month: number): boolean {
  return injuredIn !== null && (month === injuredIn + 1 || month === injuredIn + 2)
}

/** What is wrong with a trial, if anything. */
export type Mishap = 'steppedOff' | 'fidgets' | 'swappedFeet' | 'drift' | null

/** The one trial in so many whose landing ran off the plates. */
const steppedOffOneIn = 40
const fidgetOneIn = 55

/** Month and squad of the day when a plate drifted, and of the day when its cables were swapped. */
const driftDay = { squad: 1, month: 9 }
const swappedDay = { squad: 0, month: 5 }

export function mishapOf(squad: number, month: number, place: number, random: Random): Mishap {
  if (squad === driftDay.squad && month === driftDay.month && place < 4) return 'drift'
  if (squad === swappedDay.squad && month === swappedDay.month && place < 6) return 'swappedFeet'
  const dice = random.next()
  if (dice < 1 / steppedOffOneIn) return 'steppedOff'
  return dice < 1 / steppedOffOneIn + 1 / fidgetOneIn ? 'fidgets' : null
}

/** Everything that makes the file of an athlete's attempts at another test, one after the other. */
export interface AttemptsRecipe {
  athlete: Pick<JumpOptions, 'massKg' | 'body'>
  attempts: readonly GivenAttempt[]
  plates: Recipe['plates']
  seed: number
}

export interface Recipe {
  jump: Partial<JumpOptions>
  plates: { left: Partial<PlateOptions>; right: Partial<PlateOptions> }
  swapped: boolean
  seed: number
}

/** Everything that makes one trial's file, for the thread that makes it. */
export function recipeOf(athlete: Athlete, month: number, mishap: Mishap, day: Random, seed: number): Recipe {
  const random = seededRandom(seed)
  const back = athlete.injuredIn === null ? null : month - athlete.injuredIn - 3
  const isBack = back !== null && back >= 0
  // Back from injury, a third of what is missing returns each month.
  const missing = isBack ? 0.45 * (2 / 3) ** back : 0
  const velocity =
    athlete.velocity + athlete.gain * month - missing + day.normal() * 0.03 + random.normal() * 0.035
  const leans = isBack ? 0.1 * (2 / 3) ** back : 0
  const { depthM, unweightingS, pushS, landingS } = athlete.style
  return {
    jump: {
      ...athlete.style,
      massKg: athlete.massKg + day.normal() * 0.4,
      takeoffVelocity: Math.max(1.5, velocity),
      depthM: depthM * (1 + random.normal() * 0.04),
      unweightingS: unweightingS * (1 + random.normal() * 0.03),
      pushS: pushS * (1 + random.normal() * 0.02),
      landingS: landingS * (1 + random.normal() * 0.05),
      stanceS: random.between(1.7, 2.1),
      shares: sharesOf(athlete.leftShare - leans, random),
      body: {
        swayVelocity: 0.003,
        heartbeatN: random.between(2, 5),
        heartRateHz: random.between(1, 1.5),
        fidgetN: mishap === 'fidgets' ? 45 : 0,
      },
      stepOffAfterS: mishap === 'steppedOff' ? random.between(0.06, 0.5) : null,
    },
    plates: { left: plateOf(1, mishap), right: plateOf(-1, mishap) },
    swapped: mishap === 'swappedFeet',
    seed,
  }
}

function sharesOf(left: number, random: Random): LeftShares {
  const around = (spread: number) => left + random.normal() * spread
  return {
    stance: around(0.01),
    unweighting: around(0.01),
    braking: around(0.012),
    propulsion: around(0.01),
    landing: around(0.025),
  }
}

export function plateOf(sign: 1 | -1, mishap: Mishap): Partial<PlateOptions> {
  return {
    gainError: sign * 0.0012,
    offsetN: sign * 1.5,
    driftNPerS: mishap === 'drift' && sign === 1 ? 9 : sign * 0.05,
    whiteNoiseN: 0.9,
    slowNoiseN: 0.5,
    ringingN: 15,
  }
}
