import { changeUpload as endpoint, type Upload } from '../../../shared/contracts/uploads.ts'
import { call } from '../client.ts'

/** Gives up a file that this page was sending; what has arrived is kept. */
export function dismissUpload(uploadId: string, version: number, idempotencyKey: string): Promise<Upload> {
  return call(endpoint, { params: { uploadId }, body: { version, dismissed: true } }, { idempotencyKey })
}
