import { sendChunk as endpoint } from '../../../shared/contracts/uploads.ts'
import { call } from '../client.ts'

/** Sends one piece of a file; sending it again does no harm. */
export async function sendChunk(uploadId: string, n: number, bytes: Blob): Promise<void> {
  const body = new FormData()
  body.append('chunk', bytes, 'chunk')
  await call(endpoint, { params: { uploadId, n }, body })
}
