import { createHash } from 'node:crypto'
import { limits } from '../../../shared/contracts/limits.ts'
import type { ClubContext } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import { archivedBytes, type StoredInArchive } from './archive/archived-file.ts'
import { readChunk } from './files.queries.ts'

/** How many chunks a file of this size comes in; an empty file has none. */
export const chunkCount = (sizeBytes: number) => Math.ceil(sizeBytes / limits.chunkBytes)

/** Bytes that the chunk in place `n` must have: all but the last are full. */
export const chunkLength = (sizeBytes: number, n: number) =>
  Math.min(limits.chunkBytes, sizeBytes - n * limits.chunkBytes)

interface StoredFile {
  fileId: string
  sizeBytes: number
  storedIn: StoredInArchive | null
}

/**
 * The chunks of a file in order, each by a short read of its own: no file is ever whole in a transaction. A file of
 * an archive comes in the pieces in which it unfolds.
 */
export async function* chunksOf(deps: Deps, ctx: ClubContext, { fileId, sizeBytes, storedIn }: StoredFile) {
  if (storedIn) {
    yield* archivedBytes(deps, ctx, storedIn)
    return
  }
  for (let n = 0; n < chunkCount(sizeBytes); n++) {
    const bytes = await deps.db.inClub(ctx, (tx) => readChunk(tx, ctx.clubId, fileId, n))
    if (!bytes) throw new Error(`Chunk ${n} of a finished file is gone.`)
    yield bytes
  }
}

/** SHA-256 over the chunks in order. */
export async function hashFile(deps: Deps, ctx: ClubContext, file: StoredFile): Promise<Buffer> {
  const hash = createHash('sha256')
  for await (const bytes of chunksOf(deps, ctx, file)) hash.update(bytes)
  return hash.digest()
}

/** The whole file in one piece of memory, for a thread to read; at most `limits.fileBytes`. */
export async function wholeFile(deps: Deps, ctx: ClubContext, file: StoredFile): Promise<Uint8Array> {
  const whole = new Uint8Array(file.sizeBytes)
  let at = 0
  for await (const bytes of chunksOf(deps, ctx, file)) {
    whole.set(bytes, at)
    at += bytes.length
  }
  return whole
}
