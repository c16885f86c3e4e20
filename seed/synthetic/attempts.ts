import type {
  AttemptFrame,
  ContactOptions,
  CountermovementOptions,
  DropJumpOptions,
  DropLandingOptions,
  HopsOptions,
  LandingOptions,
  SquatJumpOptions,
} from './options.ts'

/** The tests that an athlete can do. */
export const syntheticProtocols = ['cmj', 'sj', 'dj', 'slcmj', 'dropLanding', 'hops'] as const
export type SyntheticProtocol = (typeof syntheticProtocols)[number]

/** One test, with all that makes it this one. */
export type Attempt =
  | ({ protocol: 'cmj' | 'slcmj' } & CountermovementOptions)
  | ({ protocol: 'sj' } & SquatJumpOptions)
  | ({ protocol: 'dj' } & DropJumpOptions)
  | ({ protocol: 'dropLanding' } & DropLandingOptions)
  | ({ protocol: 'hops' } & HopsOptions)

type Given<A> = A extends Attempt ? Pick<A, 'protocol'> & Partial<A> : never
/** A test of which only what matters is said; the rest is as by default. */
export type GivenAttempt = Given<Attempt>

const frame: AttemptFrame = {
  stanceS: 1.8,
  side: 'both',
  shares: { stance: 0.5, unweighting: 0.5, braking: 0.5, propulsion: 0.5, landing: 0.5 },
  settleS: 1.5,
  stepOffAfterS: null,
  leavesForS: null,
}

const landing: LandingOptions = {
  landing: 'onePeak',
  touchdownEdge: 'steep',
  landingS: 0.24,
  risingS: 0.9,
}

const push = {
  takeoffVelocity: 2.5,
  pushS: 0.38,
  unloadingS: 0.04,
  push: 'even',
  takeoffEdge: 'steep',
} as const

export const defaultCountermovement: CountermovementOptions = {
  ...frame,
  ...landing,
  ...push,
  depthM: 0.32,
  unweightingS: 0.42,
  landsLowerM: 0,
}

const squatJump: SquatJumpOptions = {
  ...frame,
  ...landing,
  ...push,
  takeoffVelocity: 2.4,
  pushS: 0.36,
  dipFraction: 0,
  dipS: 0.2,
  takeoffHeightM: 0.08,
  standsFirstS: null,
  loweringS: 1,
  landsLowerM: 0,
}

const drop = { boxHeightM: 0.3, dropHeightM: 0.3, touchHeightM: 0.06 }

const dropJump: DropJumpOptions = {
  ...frame,
  ...landing,
  ...drop,
  stanceS: 1.2,
  contactS: 0.2,
  contact: 'spring',
  takeoffVelocity: 2.4,
  landsLowerM: 0,
}

const dropLanding: DropLandingOptions = { ...frame, ...landing, ...drop, stanceS: 1.2 }

const hop: ContactOptions = { contactS: 0.19, contact: 'spring', takeoffVelocity: 2.2 }

const hops: HopsOptions = {
  ...defaultCountermovement,
  takeoffVelocity: 2.2,
  contacts: Array.from({ length: 10 }, () => hop),
  touchHeightM: 0.06,
}

/** One foot carries all of it. */
function onOneFoot<A extends AttemptFrame>(attempt: A): A {
  if (attempt.side === 'both') return attempt
  const share = attempt.side === 'left' ? 1 : 0
  return {
    ...attempt,
    shares: { stance: share, unweighting: share, braking: share, propulsion: share, landing: share },
  }
}

/** The whole attempt; a single-leg jump is on the left leg unless told otherwise. */
export function completeAttempt(given: GivenAttempt): Attempt {
  switch (given.protocol) {
    case 'cmj':
      return onOneFoot({ ...defaultCountermovement, ...given })
    case 'slcmj':
      return onOneFoot({
        ...defaultCountermovement,
        takeoffVelocity: 1.7,
        depthM: 0.24,
        side: 'left',
        ...given,
      })
    case 'sj':
      return onOneFoot({ ...squatJump, ...given })
    case 'dj':
      return onOneFoot({ ...dropJump, ...given })
    case 'dropLanding':
      return onOneFoot({ ...dropLanding, ...given })
    case 'hops':
      return onOneFoot({ ...hops, ...given })
  }
}
