import { ApiError } from '../api-error.ts'

/** The recording that the worked examples are computed from: invented, and open to everybody. */
export const samplePath = '/samples/two-plates.csv'

/** The bytes of the sample recording. @throws ApiError where it cannot be fetched. */
export async function getSampleRecording(signal?: AbortSignal): Promise<Uint8Array> {
  let response: Response
  try {
    response = await fetch(samplePath, signal ? { signal } : {})
  } catch (cause) {
    if (signal?.aborted) throw cause
    throw new ApiError('no-answer', 'The sample recording could not be fetched.')
  }
  if (!response.ok)
    throw new ApiError('answer-unreadable', `The sample recording came with status ${response.status}.`)
  return new Uint8Array(await response.arrayBuffer())
}
