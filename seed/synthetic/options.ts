/** How the push upward goes: one even hump, an early hump, a late hump, or two humps. */
export type PushShape = 'even' | 'early' | 'late' | 'twoHumps'
/** How the landing goes: one peak, or a short first peak of the forefoot and a longer second one. */
export type LandingShape = 'onePeak' | 'twoPeaks'
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

/** What the body does. Times in seconds, lengths in metres. */
export interface JumpOptions {
  massKg: number
  /** m/s² */
  gravity: number
  /** Velocity at the instant the force reaches zero, m/s. */
  takeoffVelocity: number
  /** Depth of the dip below standing, m, positive. */
  depthM: number
  /** Quiet stance before the movement; any instant, on the sample grid or between. */
  stanceS: number
  unweightingS: number
  /** From minimum velocity to the beginning of the unloading. */
  pushS: number
  unloadingS: number
  push: PushShape
  takeoffEdge: Edge
  landing: LandingShape
  touchdownEdge: Edge
  landingS: number
  /** How far below the takeoff height the body touches down: knees drawn up. */
  landsLowerM: number
  /** Rising from the landing back to standing. */
  risingS: number
  shares: LeftShares
  body: BodyNoiseOptions
  /** Leaves the plates so long after touchdown; null: stays. */
  stepOffAfterS: number | null
}

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
  /** Ringing after touchdown. */
  ringingN: number
  ringingHz: number
  ringingDecayS: number
  /** Step of the converter, N; 0 for none. */
  stepN: number
}

/** How it is recorded. */
export interface SamplingOptions {
  sampleRateHz: number
  durationS: number
  /** One plate under both feet, or one under each. */
  plates: 1 | 2
}

export const defaultJump: JumpOptions = {
  massKg: 75,
  gravity: 9.80665,
  takeoffVelocity: 2.5,
  depthM: 0.32,
  stanceS: 1.8,
  unweightingS: 0.42,
  pushS: 0.38,
  unloadingS: 0.04,
  push: 'even',
  takeoffEdge: 'steep',
  landing: 'onePeak',
  touchdownEdge: 'steep',
  landingS: 0.24,
  landsLowerM: 0,
  risingS: 0.9,
  shares: { stance: 0.5, unweighting: 0.5, braking: 0.5, propulsion: 0.5, landing: 0.5 },
  body: { swayVelocity: 0, heartbeatN: 0, heartRateHz: 1.1, fidgetN: 0 },
  stepOffAfterS: null,
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
  stepN: 0,
}

export const defaultSampling: SamplingOptions = { sampleRateHz: 1000, durationS: 6, plates: 2 }
