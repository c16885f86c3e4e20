import { getOriginal } from '../../../shared/contracts/uploads.ts'
import { addressOf } from '../client.ts'

/** Where the browser downloads an upload's original from, byte for byte. */
export function originalAddress(uploadId: string): string {
  return addressOf(getOriginal, { params: { uploadId } })
}
