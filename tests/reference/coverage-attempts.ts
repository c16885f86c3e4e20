import type { GivenAttempt, SyntheticProtocol } from '../../seed/synthetic/attempts.ts'
import type { ContactShape } from '../../seed/synthetic/options.ts'
import type { Random } from '../../seed/synthetic/random.ts'
import { drawCounterMove, drawLanding, drawShares, drawSquatPush, gravity } from './coverage-draws.ts'

const contacts: readonly ContactShape[] = ['spring', 'round', 'impact', 'early']

/** An attempt, and by what kind of it the trials are told apart. */
export interface DrawnAttempt {
  attempt: GivenAttempt
  shape: Record<string, string>
}

const frameOf = (random: Random) => ({
  stanceS: random.between(1.4, 3.2),
  settleS: random.between(1.5, 2.5),
  shares: drawShares(random),
})

/** @param slower share of the velocity that a load leaves */
function drawCmj(random: Random, slower: number): DrawnAttempt {
  const push = drawCounterMove(random, slower * random.between(1.9, 3.1))
  const landing = drawLanding(random, push.takeoffVelocity)
  const lower = { landsLowerM: random.between(0, 0.04) }
  return {
    attempt: { protocol: 'cmj', ...frameOf(random), ...push, ...landing, ...lower },
    shape: { push: push.push, landing: landing.landing },
  }
}

function drawSlcmj(random: Random): DrawnAttempt {
  const push = drawCounterMove(random, random.between(1.3, 2.1))
  const landing = drawLanding(random, push.takeoffVelocity)
  const side = random.pick(['left', 'right'] as const)
  const lower = { landsLowerM: random.between(0, 0.03) }
  return {
    attempt: { protocol: 'slcmj', ...frameOf(random), side, ...push, ...landing, ...lower },
    shape: { push: push.push, landing: landing.landing, side },
  }
}

/** A dip is either none or plain: one at the very limit of the onset would make two answers right. */
function drawSj(random: Random): DrawnAttempt {
  const push = drawSquatPush(random, random.between(1.8, 2.9))
  const landing = drawLanding(random, push.takeoffVelocity)
  const dip = random.pick(['none', 'none', 'small'] as const)
  const start = random.pick(['squat', 'squat', 'standing'] as const)
  return {
    attempt: {
      protocol: 'sj',
      ...frameOf(random),
      ...push,
      ...landing,
      stanceS: random.between(1.6, 3.2),
      dipFraction: dip === 'none' ? 0 : random.between(0.05, 0.09),
      dipS: random.between(0.15, 0.25),
      takeoffHeightM: random.between(0.06, 0.1),
      standsFirstS: start === 'squat' ? null : random.between(1, 2),
      landsLowerM: random.between(0, 0.04),
    },
    shape: { push: push.push, landing: landing.landing, dip, start },
  }
}

function drawDrop(random: Random) {
  const dropHeightM = random.between(0.2, 0.5)
  return {
    dropHeightM,
    boxHeightM: dropHeightM + random.between(-0.03, 0.05),
    touchHeightM: random.between(0.03, 0.08),
    stanceS: random.between(0.6, 2),
  }
}

const arrivalSpeed = (dropHeightM: number): number => Math.sqrt(2 * gravity * dropHeightM)

/** Leaves up to 2 cm lower or 6 cm higher than it came: the mean velocity of an even contact times its length. */
function drawRebound(random: Random, dropHeightM: number) {
  const contactS = random.between(0.15, 0.3)
  return {
    contactS,
    takeoffVelocity: Math.min(3.2, arrivalSpeed(dropHeightM) + (2 * random.between(-0.02, 0.06)) / contactS),
  }
}

function drawDj(random: Random): DrawnAttempt {
  const contact = random.pick(contacts)
  const drop = drawDrop(random)
  const jump = drawRebound(random, drop.dropHeightM)
  const landing = drawLanding(random, jump.takeoffVelocity)
  const lower = { landsLowerM: random.between(0, 0.03) }
  return {
    attempt: {
      protocol: 'dj',
      ...frameOf(random),
      ...drop,
      ...jump,
      contact,
      ...landing,
      ...lower,
    },
    shape: { contact, landing: landing.landing },
  }
}

function drawDropLanding(random: Random): DrawnAttempt {
  const drop = drawDrop(random)
  const landing = drawLanding(random, arrivalSpeed(drop.dropHeightM))
  const side = random.pick(['both', 'both', 'left', 'right'] as const)
  return {
    attempt: { protocol: 'dropLanding', ...frameOf(random), ...drop, side, ...landing },
    shape: { landing: landing.landing, side },
  }
}

/** Now and then one contact is far too long to count; none is so near the limit that two answers are right. */
function drawHops(random: Random): DrawnAttempt {
  const contact = random.pick(contacts)
  const speed = random.between(1.7, 2.5)
  const length = random.between(0.17, 0.22)
  const slow = random.next() < 0.2 ? Math.floor(random.between(0, 10)) : -1
  const landing = drawLanding(random, speed)
  return {
    attempt: {
      protocol: 'hops',
      ...frameOf(random),
      ...drawCounterMove(random, speed),
      ...landing,
      contacts: Array.from({ length: 10 }, (_, i) => ({
        contactS: i === slow ? random.between(0.28, 0.33) : length + random.between(-0.015, 0.015),
        contact,
        takeoffVelocity: speed + random.between(-0.1, 0.1),
      })),
      touchHeightM: random.between(0.04, 0.08),
    },
    shape: { contact, counted: slow < 0 ? 'ten' : 'nine' },
  }
}

export function drawAttempt(protocol: SyntheticProtocol, random: Random, slower = 1): DrawnAttempt {
  switch (protocol) {
    case 'cmj':
      return drawCmj(random, slower)
    case 'slcmj':
      return drawSlcmj(random)
    case 'sj':
      return drawSj(random)
    case 'dj':
      return drawDj(random)
    case 'dropLanding':
      return drawDropLanding(random)
    case 'hops':
      return drawHops(random)
  }
}
