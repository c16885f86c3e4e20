import type { Upload } from '../../../shared/contracts/uploads.ts'
import { isApiError } from '../../api/api-error.ts'
import { wordingOf } from '../../lib/error-wording.ts'
import type { QueuedFile } from './upload-queue.ts'

/** One file of this page's drop, from the disk to the sheet. */
export interface FileProgress {
  key: string
  fileName: string
  words: string
  /** 0 to 1 while it goes up; null before and after. */
  sent: number | null
  problem: { sentence: string; remedy: string } | null
  canRetry: boolean
  canRemove: boolean
  done: boolean
}

/** What there is to say of a file, by what this page knows and what the server says of it. */
export function fileProgress(file: QueuedFile, upload: Upload | undefined): FileProgress {
  const { key, fileName, stage } = file
  const said = wordsOf(file, upload)
  return {
    key,
    fileName,
    words: said,
    sent: stage === 'sending' ? (file.sizeBytes === 0 ? 1 : file.sentBytes / file.sizeBytes) : null,
    problem: problemOf(file, upload),
    canRetry: stage === 'failed',
    canRemove: stage !== 'sent',
    done:
      stage === 'sent' && upload !== undefined && upload.state !== 'waiting' && upload.state !== 'receiving',
  }
}

function wordsOf({ stage }: QueuedFile, upload: Upload | undefined): string {
  if (stage === 'refused') return 'not sent'
  if (stage === 'queued') return 'in line'
  if (stage === 'sending') return 'going up'
  if (stage === 'failed') return 'stopped'
  switch (upload?.state) {
    case 'read':
      return upload.trials === 1 ? 'read, 1 trial' : `read, ${upload.trials} trials`
    case 'unpacked':
      return 'unpacked, its files are in the list'
    case 'refused':
      return 'could not be read'
    case 'duplicate':
      return 'here already'
    default:
      return 'sent, being read'
  }
}

function problemOf(
  { stage, refusal, error }: QueuedFile,
  upload: Upload | undefined,
): FileProgress['problem'] {
  if (refusal) return refusal
  if (stage === 'failed') {
    const { title, advice } = wordingOf(error)
    return { sentence: isApiError(error) ? error.message : `${title}.`, remedy: advice }
  }
  return stage === 'sent' && upload?.error ? upload.error : null
}

/** "41 of 48 files read", over what the server has, less what was given up half-way, and what is still on this page. */
export function readCount(
  uploads: readonly Upload[],
  files: readonly QueuedFile[],
): { read: number; of: number } {
  const announced = new Set(uploads.map((upload) => upload.id))
  const coming = files.filter(
    (file) => file.stage !== 'refused' && (file.uploadId === null || !announced.has(file.uploadId)),
  )
  const wanted = uploads.filter((upload) => upload.state !== 'receiving' || upload.dismissed === null)
  const settled = wanted.filter((upload) => upload.state !== 'receiving' && upload.state !== 'waiting')
  return { read: settled.length, of: wanted.length + coming.length }
}

/**
 * Whether this page is sending an upload itself. The server's word of a new one may come before the answer to its
 * announcement: then only its name and size tell.
 */
export function isOnItsWay(upload: Upload, files: readonly QueuedFile[]): boolean {
  return files.some(({ stage, uploadId, fileName, sizeBytes }) => {
    if (stage === 'sent') return false
    if (uploadId !== null) return uploadId === upload.id
    const sameFile = fileName === upload.fileName && sizeBytes === upload.sizeBytes
    return stage === 'sending' && upload.state === 'receiving' && sameFile
  })
}
