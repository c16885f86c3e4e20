import type { ContactShape, LandingShape, PushShape } from './shapes.ts'

export type { ContactShape, LandingShape, PushShape } from './shapes.ts'

/** How the force leaves zero and comes back to it: level, or with a slope. */
export type Edge = 'soft' | 'steep'

/** Share of the total force under the left foot, 0 to 1, phase by phase. */
export interface LeftShares {
  stance: number
  unweighting: number
  braking: number
  propulsion: number
  landing: number
}

/** Who jumps. */
export interface Athlete {
  /** Without load. */
  massKg: number
  /** Carried through everything, e.g. a bar. */
  loadKg: number
  /** m/s² */
  gravity: number
  body: BodyNoiseOptions
}

/** Mass that the feet carry, kg. */
export const systemKg = ({ massKg, loadKg }: Athlete): number => massKg + loadKg

/** A push from rest into the air. Times in seconds, lengths in metres, as everywhere here. */
export interface PushOptions {
  /** Velocity at the instant the force reaches zero, m/s. */
  takeoffVelocity: number
  /** From minimum velocity, or rest, to the beginning of the unloading. */
  pushS: number
  unloadingS: number
  push: PushShape
  takeoffEdge: Edge
}

export interface DipOptions {
  /** Depth of the dip below standing, m, positive. */
  depthM: number
  unweightingS: number
}

export interface SquatPushOptions extends PushOptions {
  /** By how much of the weight the force falls before the push; 0: not at all. */
  dipFraction: number
  dipS: number
}

/** A contact between falling and flying. */
export interface ContactOptions {
  contactS: number
  contact: ContactShape
  takeoffVelocity: number
}

export interface LandingOptions {
  landing: LandingShape
  touchdownEdge: Edge
  landingS: number
  /** Rising from the landing back to standing. */
  risingS: number
}

/** What stands around every movement. */
export interface AttemptFrame {
  /** Quiet stance before the movement; any instant, on the sample grid or between. On a box: empty plates. */
  stanceS: number
  /** Feet on the plates: both, or one. */
  side: 'both' | 'left' | 'right'
  shares: LeftShares
  /** Quiet stance after the movement. */
  settleS: number
  /** Leaves the plates so long after the last touchdown; null: stays. */
  stepOffAfterS: number | null
  /** Leaves the plates after the quiet stance for so long; null: stays. */
  leavesForS: number | null
}

/** A countermovement jump. */
export interface CountermovementOptions extends AttemptFrame, PushOptions, DipOptions, LandingOptions {
  /** How far below the takeoff height the body touches down: knees drawn up. */
  landsLowerM: number
}

/** A jump out of the held squat, which is as deep as the push's way asks for. */
export interface SquatJumpOptions extends AttemptFrame, SquatPushOptions, LandingOptions {
  /** Height above standing at which the force reaches zero: up on the toes. */
  takeoffHeightM: number
  /** Stands so long before going down; null: the recording begins in the squat. The hold is `stanceS`. */
  standsFirstS: number | null
  loweringS: number
  landsLowerM: number
}

/** Off a box, to the first touch of the plates. */
export interface DropOptions {
  /** What the tape measure says. */
  boxHeightM: number
  /** What the fall truly amounts to: v²/2g at the first touch. */
  dropHeightM: number
  /** Height of the body above standing at the first touch: on the toes. */
  touchHeightM: number
}

export interface DropJumpOptions extends AttemptFrame, DropOptions, ContactOptions, LandingOptions {
  landsLowerM: number
}

export type DropLandingOptions = AttemptFrame & DropOptions & LandingOptions

/** Hops after a countermovement jump: each contact with the flight after it. */
export interface HopsOptions extends AttemptFrame, PushOptions, DipOptions, LandingOptions {
  contacts: readonly ContactOptions[]
  /** Height above standing at every touchdown; null: as high as the takeoff before it. */
  touchHeightM: number | null
}

/** What the body does in a countermovement jump, and whose body it is. */
export type JumpOptions = Athlete & Omit<CountermovementOptions, 'side' | 'settleS' | 'leavesForS'>

/** Real force that is no jump: part of the truth. */
export interface BodyNoiseOptions {
  /** SD of the vertical velocity of the body's centre in quiet stance, m/s. */
  swayVelocity: number
  /** Height of the force of a heartbeat, N. */
  heartbeatN: number
  /** Beats a second. */
  heartRateHz: number
  /** Shifting about while being weighed: amplitude of a slow wave of force, N. */
  fidgetN: number
}

/** What one plate adds to the force it carries: none of it is part of the truth. */
export interface PlateOptions {
  /** Relative error of the gain, e.g. 0.002. */
  gainError: number
  offsetN: number
  /** N/s */
  driftNPerS: number
  whiteNoiseN: number
  /** First-order autoregressive noise: SD in newtons and the time in which its correlation falls to 1/e. */
  slowNoiseN: number
  slowNoiseTimeS: number
  /** Ringing after every touchdown. */
  ringingN: number
  ringingHz: number
  ringingDecayS: number
  /** Cut-off of the recorder's own low-pass, a causal second-order Butterworth, Hz; 0 for none. */
  lowPassHz: number
  /** Step of the converter, N; 0 for none. */
  stepN: number
}

/** How it is recorded. */
export interface SamplingOptions {
  sampleRateHz: number
  /** When the recording begins on the athlete's clock; any instant. */
  startS: number
  durationS: number
  /** One plate under both feet, one under each, or one under each of which only the sum is kept. */
  plates: 1 | 2 | 'total'
}

export const defaultAthlete: Athlete = {
  massKg: 75,
  loadKg: 0,
  gravity: 9.80665,
  body: { swayVelocity: 0, heartbeatN: 0, heartRateHz: 1.1, fidgetN: 0 },
}

export const perfectPlate: PlateOptions = {
  gainError: 0,
  offsetN: 0,
  driftNPerS: 0,
  whiteNoiseN: 0,
  slowNoiseN: 0,
  slowNoiseTimeS: 0.05,
  ringingN: 0,
  ringingHz: 250,
  ringingDecayS: 0.012,
  lowPassHz: 0,
  stepN: 0,
}

export const defaultSampling: SamplingOptions = { sampleRateHz: 1000, startS: 0, durationS: 6, plates: 2 }
