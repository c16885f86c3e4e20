import { limits } from '../../shared/contracts/limits.ts'
import type { Deps } from '../../server/deps.ts'
import type { Caller } from '../../server/http/caller.ts'
import { finishUpload, startUpload, storeChunk } from '../../server/modules/uploads/uploads.service.ts'

export interface DemoFile {
  fileName: string
  bytes: () => Promise<Uint8Array>
}

const atOnce = 4

/** Drops files on a session, a few at once, as the browser does. */
export async function dropFiles(
  deps: Deps,
  coach: Caller,
  sessionId: string,
  files: readonly DemoFile[],
): Promise<void> {
  const left = [...files]
  const drop = async () => {
    for (let file = left.shift(); file; file = left.shift()) {
      await dropFile(deps, coach, sessionId, file.fileName, await file.bytes())
    }
  }
  await Promise.all(Array.from({ length: atOnce }, drop))
}

async function dropFile(
  deps: Deps,
  coach: Caller,
  sessionId: string,
  fileName: string,
  bytes: Uint8Array,
): Promise<void> {
  const { id: uploadId } = await startUpload(deps, coach, sessionId, { fileName, sizeBytes: bytes.length })
  for (let n = 0; n * limits.chunkBytes < bytes.length; n++) {
    const part = bytes.subarray(n * limits.chunkBytes, (n + 1) * limits.chunkBytes)
    await storeChunk(deps, coach, { uploadId, n, bytes: Buffer.from(part) })
  }
  await finishUpload(deps, coach, uploadId)
}
