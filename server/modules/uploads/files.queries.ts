import { and, asc, eq, inArray, sql } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import { fileChunks, files, uploads } from '../../db/schema/uploads.ts'

const ofFile = (clubId: string, fileId: string) => and(eq(files.clubId, clubId), eq(files.id, fileId))
const chunksOf = (clubId: string, fileId: string) =>
  and(eq(fileChunks.clubId, clubId), eq(fileChunks.fileId, fileId))

export async function chunkNumbers(tx: Tx, clubId: string, fileId: string): Promise<number[]> {
  const rows = await tx
    .select({ n: fileChunks.n })
    .from(fileChunks)
    .where(chunksOf(clubId, fileId))
    .orderBy(fileChunks.n)
  return rows.map(({ n }) => n)
}

/** Stores a chunk; where one stands already, says whether it has the same bytes. */
export async function insertChunk(
  tx: Tx,
  chunk: { clubId: string; fileId: string; n: number; bytes: Buffer },
): Promise<'stored' | 'same' | 'different'> {
  const stored = await tx
    .insert(fileChunks)
    .values(chunk)
    .onConflictDoNothing()
    .returning({ n: fileChunks.n })
  if (stored.length > 0) return 'stored'
  const [{ same }] = await tx
    .select({ same: sql<boolean>`${fileChunks.bytes} = ${chunk.bytes}` })
    .from(fileChunks)
    .where(and(chunksOf(chunk.clubId, chunk.fileId), eq(fileChunks.n, chunk.n)))
  return same ? 'same' : 'different'
}

export async function readChunk(tx: Tx, clubId: string, fileId: string, n: number): Promise<Buffer | null> {
  const [row] = await tx
    .select({ bytes: fileChunks.bytes })
    .from(fileChunks)
    .where(and(chunksOf(clubId, fileId), eq(fileChunks.n, n)))
  return row?.bytes ?? null
}

/** Closes a file under its hash. Fails on `files_sha256` where the club has these bytes already. */
export async function finishFile(tx: Tx, clubId: string, fileId: string, sha256: Buffer): Promise<void> {
  await tx
    .update(files)
    .set({ sha256, finishedAt: sql`now()` })
    .where(ofFile(clubId, fileId))
}

/**
 * The finished file with these bytes, locked so that whoever else brings them waits, and the first upload of it
 * that was or will be read.
 */
export async function findSameFile(tx: Tx, clubId: string, sha256: Buffer) {
  const [file] = await tx
    .select({ id: files.id })
    .from(files)
    .where(and(eq(files.clubId, clubId), eq(files.sha256, sha256)))
    .for('update')
  if (!file) return null
  const [upload] = await tx
    .select({ id: uploads.id })
    .from(uploads)
    .where(
      and(
        eq(uploads.clubId, clubId),
        eq(uploads.fileId, file.id),
        inArray(uploads.state, ['waiting', 'read']),
      ),
    )
    .orderBy(asc(uploads.createdAt))
    .limit(1)
  return { fileId: file.id, uploadId: upload?.id ?? null }
}

/** Drops bytes that stand in another file as well, and that nothing refers to any more. */
export async function dropFile(tx: Tx, clubId: string, fileId: string): Promise<void> {
  await tx.delete(fileChunks).where(chunksOf(clubId, fileId))
  await tx.delete(files).where(ofFile(clubId, fileId))
}
