import { and, eq, sql } from 'drizzle-orm'
import type { Tx } from '../../../db/database.ts'
import { fileChunks, files, uploads, type ArchivedFile } from '../../../db/schema/uploads.ts'

/** Some bytes of a chunk: the database reads no more of it than that. */
export async function readPartOfChunk(
  tx: Tx,
  chunk: { clubId: string; fileId: string; n: number },
  part: { from: number; bytes: number },
): Promise<Buffer | null> {
  const [row] = await tx
    .select({ bytes: sql<Buffer>`substring(${fileChunks.bytes} from ${part.from + 1} for ${part.bytes})` })
    .from(fileChunks)
    .where(
      and(
        eq(fileChunks.clubId, chunk.clubId),
        eq(fileChunks.fileId, chunk.fileId),
        eq(fileChunks.n, chunk.n),
      ),
    )
  return row?.bytes ?? null
}

/** A file that stands in an archive: finished, since its bytes are here already. */
export async function insertArchivedFile(
  tx: Tx,
  file: { clubId: string; sizeBytes: number; sha256: Buffer; archiveId: string; archived: ArchivedFile },
): Promise<string> {
  const [{ id }] = await tx
    .insert(files)
    .values({ ...file, finishedAt: sql`now()` })
    .returning({ id: files.id })
  return id
}

export async function insertMemberUpload(tx: Tx, upload: typeof uploads.$inferInsert): Promise<string> {
  const [{ id }] = await tx.insert(uploads).values(upload).returning({ id: uploads.id })
  return id
}
