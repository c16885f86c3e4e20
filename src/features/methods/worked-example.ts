import { analyse } from '../../../shared/mechanics/analyse.ts'
import { readRecording } from '../../../shared/recordings/read-recording.ts'
import { standardGravity } from '../../../shared/units/gravity.ts'
import type { Test } from '../../../shared/mechanics/types.ts'
import type { Trial } from '../../../shared/contracts/trials.ts'
import type { Samples } from '../../api/trials/read-samples.ts'
import { analysisOf } from '../trials/engine/analysis-of.ts'

/** Of each plate, expanded (k = 2): what the product takes where no certificate says otherwise. */
const calibrationU = { left: 0.005, right: 0.005 }

export interface WorkedExample {
  analysis: NonNullable<Trial['analysis']>
  test: Trial['test']
  recording: { sampleRateHz: number }
  samples: Samples
}

/** A file's bytes through reader and engine, as the server does it. Throws where the file holds no trial of that test. */
export function workOut(bytes: Uint8Array, fileName: string, test: Test): WorkedExample {
  const read = readRecording(bytes, fileName)
  if (!read.ok) throw new Error(read.error.sentence)
  const { recording } = read
  const { trials, engineVersion } = analyse(recording, { test, gravity: standardGravity, calibrationU })
  const [trial] = trials
  if (!trial) throw new Error('The engine found no trial in the sample recording.')
  const by = { id: fileName, engineVersion, gravity: standardGravity, movedEvents: {} }
  return {
    analysis: analysisOf(trial, by),
    test: trial.test,
    recording: { sampleRateHz: recording.sampleRateHz },
    samples: recording.channels,
  }
}
