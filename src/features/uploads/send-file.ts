import type { Upload } from '../../../shared/contracts/uploads.ts'
import { isApiError } from '../../api/api-error.ts'
import { chunkOf, chunkSize, stillToSend } from './chunk-plan.ts'

export interface Announcement {
  fileName: string
  sizeBytes: number
  idempotencyKey: string
}

/** The operations that a file goes up by. `start` takes its own place among requests. */
export interface Transport {
  start: (file: Announcement) => Promise<Upload>
  send: (uploadId: string, n: number, bytes: Blob) => Promise<void>
  finish: (uploadId: string, idempotencyKey: string) => Promise<Upload>
  dismiss: (uploadId: string, version: number, idempotencyKey: string) => Promise<Upload>
  newKey: () => string
  wait: (ms: number) => Promise<void>
}

/** A file on its way: what has been agreed with the server about it. */
export interface FileOnItsWay {
  file: File
  uploadId: string | null
  /** Of the upload: it stays the same until all of the file is there. */
  version: number
  startKey: string
  received: Set<number>
  /** False where the upload was begun on another page load, from a file that may have been another. */
  sameFile: boolean
  /** Set once a person gave the file up: no further piece is sent. */
  givenUp: boolean
}

/** Waits before a piece that got no answer is sent again, ms. */
const againMs = [1_000, 3_000, 8_000]

/**
 * Sends one file from wherever it stands: announces it, sends the pieces that are missing, finishes it. Safe to
 * call again after a failure.
 * @throws ApiError as the server or the network said.
 */
export async function sendFile(
  way: FileOnItsWay,
  transport: Transport,
  slot: Slot,
  onProgress: () => void,
): Promise<void> {
  const uploadId = way.uploadId ?? (await announce(way, transport))
  onProgress()
  try {
    await sendPieces(way, uploadId, transport, slot, onProgress)
    if (way.givenUp) return
    const finishKey = transport.newKey()
    await slot(() => patiently(() => transport.finish(uploadId, finishKey), transport))
  } catch (error) {
    if (isApiError(error, 'upload-finished')) return
    if (isApiError(error, 'upload-incomplete')) way.received.clear()
    const isOther = !way.sameFile && isApiError(error, 'chunk-invalid')
    const isGone = isApiError(error, 'not-found') || isApiError(error, 'upload-dismissed')
    if (isOther || isGone) forget(way, transport)
    if (isOther) return sendFile(way, transport, slot, onProgress)
    throw error
  }
}

type Slot = <T>(work: () => Promise<T>) => Promise<T>

async function announce(way: FileOnItsWay, transport: Transport): Promise<string> {
  const start = { fileName: way.file.name, sizeBytes: way.file.size, idempotencyKey: way.startKey }
  const upload = await patiently(() => transport.start(start), transport)
  way.uploadId = upload.id
  way.version = upload.version
  way.sameFile = true
  return upload.id
}

/** After the first piece that fails no further one is begun. */
async function sendPieces(
  way: FileOnItsWay,
  uploadId: string,
  transport: Transport,
  slot: Slot,
  onProgress: () => void,
): Promise<void> {
  let failure: { error: unknown } | null = null
  const sendOne = async (n: number) => {
    if (failure || way.givenUp) return
    try {
      await patiently(() => transport.send(uploadId, n, chunkOf(way.file, n)), transport)
      way.received.add(n)
      onProgress()
    } catch (error) {
      failure ??= { error }
    }
  }
  const missing = stillToSend(way.file.size, way.received, way.sameFile)
  await Promise.all(missing.map((n) => slot(() => sendOne(n))))
  if (failure) throw (failure as { error: unknown }).error
}

/** What the server holds under this upload is not this file, or given up: the file is announced afresh. */
function forget(way: FileOnItsWay, transport: Transport) {
  way.uploadId = null
  way.startKey = transport.newKey()
  way.received.clear()
}

async function patiently<T>(work: () => Promise<T>, { wait }: Transport): Promise<T> {
  for (const ms of againMs) {
    try {
      return await work()
    } catch (error) {
      if (!isApiError(error, 'no-answer') && !isApiError(error, 'still-running')) throw error
      await wait(ms)
    }
  }
  return work()
}

/** Bytes that have arrived. */
export function receivedBytes({ file, received }: FileOnItsWay): number {
  return [...received].reduce((sum, n) => sum + chunkSize(file.size, n), 0)
}
