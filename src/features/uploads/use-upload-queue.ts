import { useQueryClient, type QueryClient } from '@tanstack/react-query'
import { useEffect, useSyncExternalStore } from 'react'
import { randomKey } from '../../api/act-keys.ts'
import { streamHealth } from '../../api/events/stream-health.ts'
import { dismissUpload } from '../../api/uploads/dismiss-upload.ts'
import { finishUpload } from '../../api/uploads/finish-upload.ts'
import { sendChunk } from '../../api/uploads/send-chunk.ts'
import { startUpload } from '../../api/uploads/start-upload.ts'
import { sessionKeys } from '../../api/sessions/session-keys.ts'
import { createUploadQueue, type QueuedFile, type UploadQueue } from './upload-queue.ts'

/** Queues outlive the page that began them, so that a sheet can be left and come back to while files go up. */
const queues = new WeakMap<QueryClient, Map<string, UploadQueue>>()

function queueOf(queryClient: QueryClient, sessionId: string): UploadQueue {
  const ofClient = queues.get(queryClient) ?? new Map<string, UploadQueue>()
  queues.set(queryClient, ofClient)
  const queue = ofClient.get(sessionId) ?? newQueue(queryClient, sessionId)
  ofClient.set(sessionId, queue)
  return queue
}

function newQueue(queryClient: QueryClient, sessionId: string): UploadQueue {
  /** Where the club's events are heard they say the same, and gathered. */
  const refresh = () => {
    if (streamHealth.isOpen()) return
    void queryClient.invalidateQueries({ queryKey: sessionKeys.all }, { cancelRefetch: false })
  }
  return createUploadQueue({
    start: (file) => startUpload({ sessionId, ...file }),
    send: sendChunk,
    finish: async (uploadId, key) => {
      const upload = await finishUpload(uploadId, key)
      refresh()
      return upload
    },
    dismiss: async (uploadId, version, key) => {
      const upload = await dismissUpload(uploadId, version, key)
      refresh()
      return upload
    },
    newKey: randomKey,
    wait: (ms) => new Promise((resolve) => setTimeout(resolve, ms)),
  })
}

/** The session's files that this page sends; asks before the browser is closed while some are on their way. */
export function useUploadQueue(sessionId: string): { queue: UploadQueue; files: readonly QueuedFile[] } {
  const queue = queueOf(useQueryClient(), sessionId)
  const files = useSyncExternalStore(queue.subscribe, queue.files)
  const under = files.some((file) => file.stage === 'queued' || file.stage === 'sending')
  useEffect(() => {
    if (!under) return
    const ask = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', ask)
    return () => window.removeEventListener('beforeunload', ask)
  }, [under])
  return { queue, files }
}
