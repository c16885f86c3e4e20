import type { Upload } from '../../../shared/contracts/uploads.ts'
import { refusalOfSize } from './file-size-sentence.ts'
import { receivedBytes, sendFile, type Announcement, type FileOnItsWay, type Transport } from './send-file.ts'
import { slots } from './slots.ts'

/** `refused`: not sent at all. `queued`: not announced yet. `failed`: may be tried again. */
export type FileStage = 'refused' | 'queued' | 'sending' | 'failed' | 'sent'

export interface QueuedFile {
  key: string
  fileName: string
  sizeBytes: number
  stage: FileStage
  sentBytes: number
  uploadId: string | null
  /** Why it was refused or failed: what was seen and what to do. */
  refusal: { sentence: string; remedy: string } | null
  error: unknown
}

export interface UploadQueue {
  subscribe: (listener: () => void) => () => void
  files: () => readonly QueuedFile[]
  /** `begun`: uploads of the session that are not all here and may be taken up again. */
  add: (files: readonly File[], begun?: readonly Upload[]) => void
  retry: (key: string) => void
  /** Takes a file out; what of it has been announced is dismissed. One that was sent stays. */
  remove: (key: string) => void
}

/** Requests at a time. */
const atOnce = 4

interface Entry {
  view: QueuedFile
  way: FileOnItsWay
}

/** The files that this page sends to one session, several at once, each with its own progress and error. */
export function createUploadQueue(transport: Transport): UploadQueue {
  const entries = new Map<string, Entry>()
  const listeners = new Set<() => void>()
  const requestSlot = slots(atOnce)
  const announceSlot = slots(1)
  const fileSlot = slots(atOnce)
  /** One announcement at a time, so that the server has the files in the order of the drop. */
  const inOrder = {
    ...transport,
    start: (file: Announcement) => announceSlot(() => requestSlot(() => transport.start(file))),
  }
  let snapshot: readonly QueuedFile[] = []

  const publish = () => {
    snapshot = [...entries.values()].map((entry) => entry.view)
    for (const listener of listeners) listener()
  }
  const update = (key: string, change: Partial<QueuedFile>) => {
    const entry = entries.get(key)
    if (!entry) return
    entry.view = { ...entry.view, ...change }
    publish()
  }
  const send = async (key: string) => {
    const entry = entries.get(key)
    if (!entry || entry.view.stage !== 'queued') return
    const { way } = entry
    update(key, { stage: 'sending', error: null })
    const onProgress = () => update(key, { sentBytes: receivedBytes(way), uploadId: way.uploadId })
    try {
      await sendFile(way, inOrder, requestSlot, onProgress)
      update(key, { stage: 'sent', sentBytes: way.file.size })
    } catch (error) {
      update(key, { stage: 'failed', error, uploadId: way.uploadId })
    }
    if (way.givenUp) dismiss(way)
  }
  /** Where this fails the upload stands in the Tray as one that stopped, and can be dismissed there. */
  const dismiss = (way: FileOnItsWay) => {
    const { uploadId, version } = way
    if (uploadId === null) return
    way.uploadId = null
    requestSlot(() => transport.dismiss(uploadId, version, transport.newKey())).catch(() => undefined)
  }
  const enqueue = (key: string) => void fileSlot(() => send(key))

  return {
    subscribe: (listener) => {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
    files: () => snapshot,
    add: (files, begun = []) => {
      const taken = new Set([...entries.values()].map((entry) => entry.way.uploadId))
      const added = files.map((file) => {
        const earlier = begun.find((upload) => isSameFile(upload, file) && !taken.has(upload.id))
        if (earlier) taken.add(earlier.id)
        return newEntry(file, earlier, transport.newKey)
      })
      for (const entry of added) entries.set(entry.view.key, entry)
      publish()
      for (const { view } of added) if (view.stage === 'queued') enqueue(view.key)
    },
    retry: (key) => {
      if (entries.get(key)?.view.stage !== 'failed') return
      update(key, { stage: 'queued', error: null })
      enqueue(key)
    },
    remove: (key) => {
      const entry = entries.get(key)
      if (!entry || entry.view.stage === 'sent') return
      entries.delete(key)
      publish()
      entry.way.givenUp = true
      if (entry.view.stage !== 'sending' || entry.way.uploadId !== null) dismiss(entry.way)
    },
  }
}

const isSameFile = (upload: Upload, file: File) =>
  upload.state === 'receiving' &&
  upload.dismissed === null &&
  upload.fileName === file.name &&
  upload.sizeBytes === file.size

function newEntry(file: File, earlier: Upload | undefined, newKey: () => string): Entry {
  const refusal = refusalOfSize(file.size)
  return {
    view: {
      key: newKey(),
      fileName: file.name,
      sizeBytes: file.size,
      stage: refusal ? 'refused' : 'queued',
      sentBytes: 0,
      uploadId: earlier?.id ?? null,
      refusal,
      error: null,
    },
    way: {
      file,
      uploadId: earlier?.id ?? null,
      version: earlier?.version ?? 0,
      startKey: newKey(),
      received: new Set(earlier?.chunksReceived),
      sameFile: earlier === undefined,
      givenUp: false,
    },
  }
}
