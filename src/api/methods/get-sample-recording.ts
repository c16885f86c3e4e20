import type { Protocol, Test } from '../../../shared/mechanics/types.ts'
import { ApiError } from '../api-error.ts'

/** A recording that worked examples are computed from: invented, and open to everybody. */
export interface SampleRecording {
  path: string
  test: Test
}

const sample = (file: string, protocol: Protocol, test: Partial<Test> = {}): SampleRecording => ({
  path: `/samples/${file}`,
  test: { protocol, side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips', ...test },
})

/** One of every test. */
export const sampleRecordings: Readonly<Record<Protocol, SampleRecording>> = {
  cmj: sample('two-plates.csv', 'cmj'),
  sj: sample('squat-jump.csv', 'sj'),
  dj: sample('drop-jump.csv', 'dj', { boxHeightM: 0.3 }),
  slcmj: sample('single-leg-right.csv', 'slcmj', { side: 'right' }),
  dropLanding: sample('drop-landing.csv', 'dropLanding', { boxHeightM: 0.3 }),
  hops: sample('hops.csv', 'hops'),
}

/** The bytes of a sample recording. @throws ApiError where it cannot be fetched. */
export async function getSampleRecording(path: string, signal?: AbortSignal): Promise<Uint8Array> {
  let response: Response
  try {
    response = await fetch(path, signal ? { signal } : {})
  } catch (cause) {
    if (signal?.aborted) throw cause
    throw new ApiError('no-answer', 'The sample recording could not be fetched.')
  }
  if (!response.ok)
    throw new ApiError('answer-unreadable', `The sample recording came with status ${response.status}.`)
  return new Uint8Array(await response.arrayBuffer())
}
