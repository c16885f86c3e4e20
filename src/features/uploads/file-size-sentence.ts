import { limits } from '../../../shared/contracts/limits.ts'
import { tooLargeError } from '../../../shared/recordings/errors.ts'

/** The reader's own sentence for a file over the limit, before a byte is sent; null for one that may go. */
export function refusalOfSize(sizeBytes: number): { sentence: string; remedy: string } | null {
  return sizeBytes > limits.fileBytes ? tooLargeError(sizeBytes) : null
}
