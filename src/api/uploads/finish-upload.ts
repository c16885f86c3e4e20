import { finishUpload as endpoint, type Upload } from '../../../shared/contracts/uploads.ts'
import { call } from '../client.ts'

/** All pieces are there: the server hashes the whole and reads it. */
export function finishUpload(uploadId: string, idempotencyKey: string): Promise<Upload> {
  return call(endpoint, { params: { uploadId } }, { idempotencyKey })
}
