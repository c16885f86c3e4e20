import type { GivenAttempt } from '../synthetic/attempts.ts'
import { fileStyle, fileStyles } from '../synthetic/file-styles.ts'
import type { FileStyle } from '../synthetic/file-styles.ts'
import { makeJump } from '../synthetic/jump.ts'
import type { JumpOptions, PlateOptions, SamplingOptions } from '../synthetic/options.ts'
import { perform } from '../synthetic/perform.ts'
import { recordJump } from '../synthetic/record.ts'
import { writeDelimited } from '../synthetic/write-delimited.ts'

interface Sample {
  jump: Partial<JumpOptions>
  /** Another test than a countermovement jump, by the athlete of `jump`. */
  attempt?: GivenAttempt
  sampling: Partial<SamplingOptions>
  style: FileStyle
  seed: number
}

const invented = 'Invented recording of an invented athlete'
const body = { swayVelocity: 0.002, heartbeatN: 2, heartRateHz: 1.1, fidgetN: 0 }
const plate: Partial<PlateOptions> = {
  whiteNoiseN: 1,
  slowNoiseN: 0.6,
  offsetN: 1.5,
  ringingN: 20,
  stepN: 0.1,
}
const uneven = { stance: 0.51, unweighting: 0.5, braking: 0.47, propulsion: 0.48, landing: 0.55 }

const athlete = { massKg: 72.6, body }
const plain = fileStyle({ preamble: [invented] })

/** One of each other test, for the worked examples of what is measured there alone. */
const otherTests: Record<string, Sample> = {
  'squat-jump.csv': {
    jump: athlete,
    attempt: { protocol: 'sj', takeoffVelocity: 2.38, stanceS: 2.2, settleS: 1.4 },
    sampling: {},
    style: plain,
    seed: 105,
  },
  'drop-jump.csv': {
    jump: athlete,
    attempt: { protocol: 'dj', boxHeightM: 0.3, dropHeightM: 0.29, takeoffVelocity: 2.36, settleS: 2 },
    sampling: {},
    style: plain,
    seed: 106,
  },
  'single-leg-right.csv': {
    jump: athlete,
    attempt: { protocol: 'slcmj', side: 'right', takeoffVelocity: 1.62, depthM: 0.22 },
    sampling: {},
    style: plain,
    seed: 107,
  },
  'drop-landing.csv': {
    jump: athlete,
    attempt: { protocol: 'dropLanding', boxHeightM: 0.3, dropHeightM: 0.29, settleS: 2.2 },
    sampling: {},
    style: plain,
    seed: 108,
  },
  'hops.csv': {
    jump: athlete,
    attempt: { protocol: 'hops', settleS: 1.6 },
    sampling: { sampleRateHz: 500, durationS: 13 },
    style: plain,
    seed: 109,
  },
}

/** The sample files by name: a jump each, in a style each. */
const samples: Record<string, Sample> = {
  'two-plates.csv': {
    jump: { massKg: 78.4, takeoffVelocity: 2.62, depthM: 0.31, body, stanceS: 1.813 },
    sampling: {},
    style: fileStyle({ preamble: [invented] }),
    seed: 101,
  },
  'two-plates-semicolon.csv': {
    jump: {
      massKg: 63.2,
      takeoffVelocity: 2.31,
      depthM: 0.27,
      push: 'twoHumps',
      landing: 'twoPeaks',
      shares: uneven,
      body,
    },
    sampling: {},
    style: { ...fileStyles.semicolon, preamble: [invented] },
    seed: 102,
  },
  'one-plate-tabs.csv': {
    jump: { massKg: 91.7, takeoffVelocity: 2.74, depthM: 0.36, push: 'late', body },
    sampling: { sampleRateHz: 2000, plates: 1, durationS: 5 },
    style: { ...fileStyles.tabbed, counter: null, forceDecimals: 1, preamble: [invented] },
    seed: 103,
  },
  'stepped-off.csv': {
    jump: { massKg: 70.1, takeoffVelocity: 2.45, depthM: 0.3, push: 'early', body, stepOffAfterS: 0.15 },
    sampling: { durationS: 5 },
    style: { ...fileStyles.quoted, total: null, preamble: [`"${invented}"`] },
    seed: 104,
  },
  ...otherTests,
}

/** The bytes of every sample file, the same on every run. */
export function sampleFiles(): Record<string, Uint8Array> {
  return Object.fromEntries(
    Object.entries(samples).map(([name, { jump, attempt, sampling, style, seed }]) => {
      const done = attempt ? perform(jump, [attempt], seed) : makeJump(jump, seed)
      const recording = recordJump(done, sampling, { left: plate, right: plate }, seed)
      return [name, writeDelimited(recording, style)]
    }),
  )
}
