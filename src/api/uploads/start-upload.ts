import { startUpload as endpoint, type Upload } from '../../../shared/contracts/uploads.ts'
import { call } from '../client.ts'

export interface NewUpload {
  sessionId: string
  fileName: string
  sizeBytes: number
  /** One a file and drop, so that a repeated try announces it once. */
  idempotencyKey: string
}

/** Announces a file to a session. */
export function startUpload({ sessionId, fileName, sizeBytes, idempotencyKey }: NewUpload): Promise<Upload> {
  return call(endpoint, { params: { sessionId }, body: { fileName, sizeBytes } }, { idempotencyKey })
}
