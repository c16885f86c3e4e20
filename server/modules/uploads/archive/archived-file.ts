import { Readable } from 'node:stream'
import { createInflateRaw } from 'node:zlib'
import { limits } from '../../../../shared/contracts/limits.ts'
import type { ClubContext } from '../../../db/database.ts'
import type { ArchivedFile } from '../../../db/schema/uploads.ts'
import type { Deps } from '../../../deps.ts'
import { readPartOfChunk } from './archived.queries.ts'

/** A file that stands in an archive of the club. */
export type StoredInArchive = Pick<ArchivedFile, 'start' | 'bytes' | 'method'> & { archiveId: string }

/** The packed bytes, a short read for each chunk of the archive that holds some of them. */
async function* packedBytes(deps: Deps, ctx: ClubContext, { archiveId, start, bytes }: StoredInArchive) {
  const size = limits.chunkBytes
  const end = start + bytes
  for (let at = start; at < end;) {
    const n = Math.floor(at / size)
    const part = { from: at - n * size, bytes: Math.min(end, (n + 1) * size) - at }
    const chunk = { clubId: ctx.clubId, fileId: archiveId, n }
    const read = await deps.db.inClub(ctx, (tx) => readPartOfChunk(tx, chunk, part))
    if (read?.length !== part.bytes) throw new Error(`Part of chunk ${n} of an archive is gone.`)
    yield read
    at += part.bytes
  }
}

/** The bytes of a file of an archive, unpacked piece by piece; its size was found when the archive was read. */
export async function* archivedBytes(
  deps: Deps,
  ctx: ClubContext,
  stored: StoredInArchive,
): AsyncGenerator<Buffer> {
  const packed = Readable.from(packedBytes(deps, ctx, stored))
  if (stored.method === 'stored') {
    yield* packed as AsyncIterable<Buffer>
    return
  }
  const inflate = createInflateRaw()
  packed.once('error', (error) => inflate.destroy(error))
  try {
    yield* packed.pipe(inflate) as AsyncIterable<Buffer>
  } finally {
    packed.destroy()
  }
}
