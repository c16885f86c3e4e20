import { fileStyle, fileStyles } from '../synthetic/file-styles.ts'
import type { FileStyle } from '../synthetic/file-styles.ts'
import { makeJump } from '../synthetic/jump.ts'
import type { JumpOptions, PlateOptions, SamplingOptions } from '../synthetic/options.ts'
import { recordJump } from '../synthetic/record.ts'
import { writeDelimited } from '../synthetic/write-delimited.ts'

interface Sample {
  jump: Partial<JumpOptions>
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
}

/** The bytes of every sample file, the same on every run. */
export function sampleFiles(): Record<string, Uint8Array> {
  return Object.fromEntries(
    Object.entries(samples).map(([name, { jump, sampling, style, seed }]) => {
      const recording = recordJump(makeJump(jump, seed), sampling, { left: plate, right: plate }, seed)
      return [name, writeDelimited(recording, style)]
    }),
  )
}
