import { limits } from '../../../shared/contracts/limits.ts'
import type { Upload } from '../../../shared/contracts/uploads.ts'

/** The pieces that a file is sent in; an empty file has none. */
export function chunkNumbers(sizeBytes: number): number[] {
  return Array.from({ length: Math.ceil(sizeBytes / limits.chunkBytes) }, (_, n) => n)
}

export function chunkOf(file: Blob, n: number): Blob {
  return file.slice(n * limits.chunkBytes, (n + 1) * limits.chunkBytes)
}

export function chunkSize(sizeBytes: number, n: number): number {
  return Math.max(0, Math.min(limits.chunkBytes, sizeBytes - n * limits.chunkBytes))
}

/**
 * What is still to be sent of an upload that was taken up again: the pieces that have not arrived, and the last
 * one that has. The server compares that one with what it holds, so that another file of the same name and size
 * is found out and not mixed in.
 */
export function stillToSend(sizeBytes: number, received: ReadonlySet<number>, sameFile: boolean): number[] {
  const last = Math.max(-1, ...received)
  return chunkNumbers(sizeBytes).filter((n) => !received.has(n) || (!sameFile && n === last))
}

/** Whole percent of an upload's bytes that have arrived; never 100 before all have. */
export function arrivedPercent({
  sizeBytes,
  chunksReceived,
}: Pick<Upload, 'sizeBytes' | 'chunksReceived'>): number {
  if (sizeBytes === 0) return 100
  const bytes = chunksReceived.reduce((sum, n) => sum + chunkSize(sizeBytes, n), 0)
  return Math.floor((100 * bytes) / sizeBytes)
}
